// @vitest-environment happy-dom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, describe, expect, it } from 'vitest';
import { LengthField } from '../../../src/components/length-field.tsx';
import { UnitsContext } from '../../../src/lib/units.ts';

afterEach(cleanup);

let value: number | null;
function Bench({ start, units }: { start: number | null; units: 'in' | 'mm' }) {
  const [mm, setMm] = useState(start);
  value = mm;
  return (
    <QueryClientProvider client={new QueryClient()}>
      <UnitsContext value={units}>
        <LengthField label="Width" value={mm} onChange={setMm} />
        <button onClick={() => setMm(25.4)}>One inch</button>
      </UnitsContext>
    </QueryClientProvider>
  );
}
const field = () => screen.getByLabelText<HTMLInputElement>('Width');

describe('a length field', () => {
  it('takes inches in a shop that works in mm, and shows them in mm on leaving', async () => {
    render(<Bench start={null} units="mm" />);
    await userEvent.type(field(), '13 7/8"');
    expect(field().value).toBe('13 7/8"');
    await userEvent.tab();
    // 13.875 in × 25.4 mm/in (exact by definition) = 352.425 mm.
    expect(value).toBeCloseTo(352.425, 9);
    expect(field().value).toBe('352.4 mm');
  });

  it('keeps the exact value of a length that is only passed through', async () => {
    render(<Bench start={352.4251} units="in" />);
    await userEvent.click(field());
    await userEvent.tab();
    expect(value).toBe(352.4251);
  });

  it('says what it cannot read, keeps it in view, and gives no number for it', async () => {
    render(<Bench start={100} units="in" />);
    await userEvent.clear(field());
    expect(value).toBeNull();
    await userEvent.type(field(), 'a hand');
    await userEvent.tab();
    expect(value).toBeNaN();
    expect(field().value).toBe('a hand');
    expect(field().getAttribute('aria-invalid')).toBe('true');
    expect(field().getAttribute('aria-describedby')).not.toBeNull();
  });

  it('gives way to a value set from elsewhere', async () => {
    render(<Bench start={100} units="in" />);
    await userEvent.clear(field());
    await userEvent.type(field(), '7');
    await userEvent.click(screen.getByRole('button', { name: 'One inch' }));
    expect(field().value).toBe('1"');
  });
});
