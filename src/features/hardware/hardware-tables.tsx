import type { ReactNode } from 'react';
import { type Anchor, anchorAllowable, ultimateDivisor } from '../../../shared/hardware/anchors.ts';
import type { Bracket } from '../../../shared/hardware/brackets.ts';
import type { Screw } from '../../../shared/hardware/screws.ts';
import { formatLoad } from '../../../shared/units/mass.ts';
import { formatStress } from '../../../shared/units/stress.ts';
import { Button } from '../../components/button.tsx';
import { fineLength } from '../../components/fine-length-field.tsx';
import { LengthText } from '../../components/length-text.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import { WeightMark } from '../../components/weight-mark.tsx';
import { useUnits } from '../../lib/units.ts';

const collator = new Intl.Collator(undefined, { numeric: true });
/** By name as a person counts: #8 before #10. */
const byName = <Entry extends { name: string }>(entries: readonly Entry[]): Entry[] => [...entries].sort((a, b) => collator.compare(a.name, b.name));

interface Deeds<Entry> {
  /** Null where the reader may not change the book. */
  onChange: ((entry: Entry) => void) | null;
  onRemove: ((entry: Entry) => void) | null;
}

export function ScrewTable({ screws, ...deeds }: { screws: readonly Screw[] } & Deeds<Screw>) {
  const units = useUnits();
  return (
    <Table caption="Screws">
      <thead>
        <tr>
          <Th>Screw</Th>
          <Th figure>Length</Th>
          <Th figure>Thread</Th>
          <Th figure>Diameter</Th>
          <Th figure>Root</Th>
          <Th figure>Head</Th>
          <Th figure>Bending yield</Th>
          <DeedsHead {...deeds} />
        </tr>
      </thead>
      <tbody>
        {byName(screws).map((screw) => (
          <tr key={screw.id}>
            <Th scope="row" className="min-w-40">{screw.name}</Th>
            <Td figure>
              <LengthText mm={screw.lengthMm} />
            </Td>
            <Td figure>
              <LengthText mm={screw.threadLengthMm} />
            </Td>
            {[screw.diameterMm, screw.rootDiameterMm, screw.headDiameterMm].map((mm, i) => (
              <Td key={i} figure className="whitespace-nowrap">
                {fineLength(mm, units)}
              </Td>
            ))}
            <Td figure className="whitespace-nowrap">
              {formatStress(screw.bendingYieldMPa, units)}
            </Td>
            <DeedsCell entry={screw} {...deeds} />
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

export function BracketTable({ brackets, screws, ...deeds }: { brackets: readonly Bracket[]; screws: readonly Screw[] } & Deeds<Bracket>) {
  const units = useUnits();
  return (
    <Table caption="Brackets">
      <thead>
        <tr>
          <Th>Bracket</Th>
          <Th figure>Working load</Th>
          <Th figure>Steel</Th>
          <Th figure>Hole</Th>
          <Th figure>Into the wall</Th>
          <Th>Into the frame</Th>
          <DeedsHead {...deeds} />
        </tr>
      </thead>
      <tbody>
        {byName(brackets).map((bracket) => {
          const screw = screws.find((s) => s.id === bracket.frameScrewId);
          return (
            <tr key={bracket.id}>
              <Th scope="row" className="min-w-40">{bracket.name}</Th>
              <Td figure>{bracket.ratingN === null ? <NoRating /> : formatLoad(bracket.ratingN, units)}</Td>
              <Td figure className="whitespace-nowrap">
                {fineLength(bracket.steelMm, units)}
              </Td>
              <Td figure className="whitespace-nowrap">
                {fineLength(bracket.holeMm, units)}
              </Td>
              <Td figure>{bracket.wallScrews === 1 ? '1 screw' : `${bracket.wallScrews} screws`}</Td>
              <Td>{screw ? `${bracket.frameScrews} × ${screw.name}` : <Missing words="Screw not chosen" />}</Td>
              <DeedsCell entry={bracket} {...deeds} />
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}

export function AnchorTable({ anchors, ...deeds }: { anchors: readonly Anchor[] } & Deeds<Anchor>) {
  const units = useUnits();
  return (
    <Table caption="Anchors">
      <thead>
        <tr>
          <Th>Anchor</Th>
          <Th>For</Th>
          <Th>Packet tells</Th>
          <Th figure>Counts along the wall</Th>
          <Th figure>Counts out of it</Th>
          <DeedsHead {...deeds} />
        </tr>
      </thead>
      <tbody>
        {byName(anchors).map((anchor) => {
          const allowed = anchorAllowable(anchor);
          const divided = anchor.ratedAs === 'ultimate' ? ` ÷ ${ultimateDivisor}` : '';
          const cell = (rated: number | null, counts: number): ReactNode =>
            rated === null ? (
              <NoRating />
            ) : (
              <>
                {formatLoad(counts, units)}
                {divided ? <span className="block text-sm text-ink-700">{`${formatLoad(rated, units)}${divided}`}</span> : null}
              </>
            );
          return (
            <tr key={anchor.id}>
              <Th scope="row" className="min-w-40">{anchor.name}</Th>
              <Td className="first-letter:uppercase">{anchor.kind}</Td>
              <Td className="first-letter:uppercase">{anchor.ratedAs}</Td>
              <Td figure>{cell(anchor.shearN, allowed.shearN)}</Td>
              <Td figure>{cell(anchor.tensionN, allowed.tensionN)}</Td>
              <DeedsCell entry={anchor} {...deeds} />
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}

const NoRating = () => <Missing words="No rating" />;

function Missing({ words }: { words: string }) {
  return (
    <span className="inline-flex items-center gap-1 whitespace-nowrap">
      <WeightMark weight="caution" wordHidden /> {words}
    </span>
  );
}

function DeedsHead({ onChange }: Deeds<never>) {
  return onChange ? (
    <Th>
      <span className="sr-only">Deeds</span>
    </Th>
  ) : null;
}

function DeedsCell<Entry extends { name: string }>({ entry, onChange, onRemove }: { entry: Entry } & Deeds<Entry>) {
  if (!onChange || !onRemove) return null;
  return (
    <Td className="py-1">
      <div className="flex justify-end gap-1">
        <Button small aria-label={`Change ${entry.name}`} onClick={() => onChange(entry)}>
          Change
        </Button>
        <Button small weight="quiet" className="whitespace-nowrap" aria-label={`Take ${entry.name} out`} onClick={() => onRemove(entry)}>
          Take out
        </Button>
      </div>
    </Td>
  );
}
