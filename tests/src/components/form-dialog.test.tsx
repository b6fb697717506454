// @vitest-environment happy-dom
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { FormDialog } from '../../../src/components/form-dialog.tsx';
import { TextField } from '../../../src/components/text-field.tsx';
import { CallError } from '../../../src/lib/call-error.ts';
import { useSheetForm } from '../../../src/lib/sheet-form.ts';

afterEach(cleanup);

const Board = z.object({ mark: z.string().min(1, 'Please mark the board.') });
const refused = (fields?: { path: string; words: string }[]) =>
  new CallError({ type: 'about:blank', title: 'It does not go together', status: 409, code: 'conflict', requestId: 'r-7', fields });

function Bench({ send, onClose }: { send: (board: { mark: string }) => Promise<unknown>; onClose: () => void }) {
  const sheet = useSheetForm({ schema: Board, defaultValues: { mark: '' }, send });
  return (
    <FormDialog title="A board" deed="Save" sheet={sheet} onClose={onClose}>
      <TextField label="Mark" error={sheet.form.formState.errors.mark?.message} {...sheet.form.register('mark')} />
    </FormDialog>
  );
}

function open(send: (board: { mark: string }) => Promise<unknown>) {
  const onClose = vi.fn();
  render(<RouterProvider router={createMemoryRouter([{ path: '/', element: <Bench send={send} onClose={onClose} /> }])} />);
  return { onClose, mark: screen.getByLabelText<HTMLInputElement>('Mark'), press: (name: string) => userEvent.click(screen.getByRole('button', { name })) };
}

it('sends nothing that its schema refuses, and brings the reader to the field', async () => {
  const send = vi.fn(() => Promise.resolve());
  const { mark, press } = open(send);
  await press('Save');
  await screen.findByText('Please mark the board.');
  await waitFor(() => expect(document.activeElement).toBe(mark));
  expect(send).not.toHaveBeenCalled();
});

it("puts the server's words on a field beside it, and keeps what was typed", async () => {
  const { mark, press } = open(() => Promise.reject(refused([{ path: 'mark', words: 'This mark is taken.' }])));
  await userEvent.type(mark, 'B7');
  await press('Save');
  await screen.findByText('This mark is taken.');
  expect(mark.value).toBe('B7');
  expect(screen.queryByRole('alert')).toBeNull();
});

it('tells a refusal that belongs to no field, with the number of the request', async () => {
  const { mark, press } = open(() => Promise.reject(refused()));
  await userEvent.type(mark, 'B7');
  await press('Save');
  const alert = await screen.findByRole('alert');
  expect(alert.textContent).toContain('It does not go together');
  expect(alert.textContent).toContain('r-7');
});

it('asks before it throws away what was typed, and closes at once when nothing was', async () => {
  const { onClose, mark, press } = open(() => Promise.resolve());
  await userEvent.type(mark, 'B7');
  await press('Cancel');
  expect(onClose).not.toHaveBeenCalled();
  await press('Keep typing');
  expect(mark.value).toBe('B7');
  await userEvent.clear(mark);
  await press('Cancel');
  expect(onClose).toHaveBeenCalledOnce();
});
