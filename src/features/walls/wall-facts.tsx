import { isConfirmed, type Wall } from '../../../shared/walls/wall.ts';
import { LengthText } from '../../components/length-text.tsx';
import { Table, Td, Th } from '../../components/table.tsx';
import { boundsOf } from '../../../shared/walls/studs.ts';
import { foundByWords, obstructionWords } from './wall-words.ts';

/** Studs and obstructions for those who read and do not change. */
export function WallFacts({ wall }: { wall: Wall }) {
  return (
    <div className="grid items-start gap-6 lg:grid-cols-2">
      <Table caption="Studs from left to right">
        <thead>
          <tr>
            <Th figure>Stud centre</Th>
            <Th>Found by</Th>
            <Th figure>Off by at most</Th>
          </tr>
        </thead>
        <tbody>
          {wall.studs.map((s) => (
            <tr key={s.id}>
              <Td figure>
                <LengthText mm={s.xMm} />
              </Td>
              <Td>
                {foundByWords[s.foundBy]}
                {isConfirmed(s) ? '' : ' (?)'}
              </Td>
              <Td figure>
                <LengthText mm={s.uncertaintyMm} />
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
      <Table caption="What stands in the way">
        <thead>
          <tr>
            <Th>Obstruction</Th>
            <Th figure>From the left</Th>
            <Th figure>Above the floor</Th>
            <Th figure>Keep clear by</Th>
          </tr>
        </thead>
        <tbody>
          {wall.obstructions.map((o) => (
            <tr key={o.id}>
              <Td>{o.name || obstructionWords[o.kind]}</Td>
              <Td figure>
                <LengthText mm={boundsOf(o.outlineMm).leftMm} />
              </Td>
              <Td figure>
                <LengthText mm={boundsOf(o.outlineMm).bottomMm} />
              </Td>
              <Td figure>
                <LengthText mm={o.clearanceMm} />
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
