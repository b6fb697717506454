import { useRef } from 'react';
import type { Point } from '../../../shared/geometry/point.ts';
import type { SheetPlan } from '../../../shared/templates/sheets.ts';
import type { TemplateInput } from '../../../shared/templates/template-input.ts';
import { classNames } from '../../components/class-names.ts';

interface Props {
  input: TemplateInput;
  plan: SheetPlan;
  chosen: string | null;
  onChoose: (sheet: string) => void;
  /** Called as the grid is pulled, with where its corner is then; null where it cannot be pulled. */
  onPull: ((origin: Point) => void) | null;
}

/** A move of less than this is a click, CSS px. */
const clickPx = 4;

/** The sheets over the wall: a click chooses one, a drag pulls the whole grid. */
export function SheetsOverWall({ input, plan, chosen, onChoose, onPull }: Props) {
  const svg = useRef<SVGSVGElement>(null);
  const held = useRef<{ at: Point; origin: Point; moved: boolean } | null>(null);
  const { widthMm, heightMm } = input.wall;
  const left = Math.min(0, ...plan.sheets.map((s) => s.window.x));
  const foot = Math.min(0, ...plan.sheets.map((s) => s.window.y));
  const right = Math.max(widthMm, ...plan.sheets.map((s) => s.window.x + s.step.x));
  const top = Math.max(heightMm, ...plan.sheets.map((s) => s.window.y + s.step.y));
  const line = Math.max(right - left, top - foot) / 700;
  const up = (y: number) => top - y;
  const mmPerPx = () => (right - left) / (svg.current?.getBoundingClientRect().width || 1);
  const points = (list: readonly Point[]) => list.map((p) => `${p.x},${up(p.y)}`).join(' ');

  return (
    <svg
      ref={svg}
      viewBox={`${left - line} ${-line} ${right - left + 2 * line} ${top - foot + 2 * line}`}
      className={classNames('block max-h-[46dvh] w-full touch-none border border-ink-500 bg-plaster-100', onPull ? 'cursor-grab active:cursor-grabbing' : undefined)}
      role="img"
      aria-label={`${plan.sheets.length} sheets over the wall; its ${input.frames.length} frames`}
      onPointerDown={(event) => {
        held.current = { at: { x: event.clientX, y: event.clientY }, origin: plan.origin, moved: false };
        if (onPull) event.currentTarget.setPointerCapture(event.pointerId);
      }}
      onPointerMove={(event) => {
        const hold = held.current;
        if (!hold || !onPull) return;
        const dx = event.clientX - hold.at.x;
        const dy = event.clientY - hold.at.y;
        if (Math.hypot(dx, dy) > clickPx) hold.moved = true;
        if (hold.moved) onPull({ x: hold.origin.x + dx * mmPerPx(), y: hold.origin.y - dy * mmPerPx() });
      }}
      onPointerUp={(event) => {
        const hold = held.current;
        held.current = null;
        if (hold?.moved) return;
        const box = event.currentTarget.getBoundingClientRect();
        const scale = mmPerPx();
        const at = { x: left + (event.clientX - box.left) * scale, y: top - (event.clientY - box.top) * scale };
        const sheet = plan.sheets.find(({ window: w, step }) => at.x >= w.x && at.x < w.x + step.x && at.y >= w.y && at.y < w.y + step.y);
        if (sheet) onChoose(sheet.name);
      }}
      onPointerCancel={() => (held.current = null)}
    >
      <rect x={0} y={up(heightMm)} width={widthMm} height={heightMm} className="fill-white stroke-ink-900" strokeWidth={line * 2} />
      {input.wall.studs.map((s, i) => (
        <line key={i} x1={s.xMm} x2={s.xMm} y1={up(0)} y2={up(heightMm)} className="stroke-chalk-600" strokeWidth={line / 2} strokeDasharray={`${line * 6} ${line * 4}`} opacity={0.6} />
      ))}
      {plan.sheets.map((s) => (
        <g key={s.name}>
          <rect
            x={s.window.x} y={up(s.window.y + s.step.y)} width={s.step.x} height={s.step.y}
            className={classNames('stroke-chalk-600', s.name === chosen ? 'fill-chalk-600' : 'fill-chalk-100')}
            fillOpacity={s.name === chosen ? 0.35 : 0.55}
            strokeWidth={line * 1.3}
          />
          <text x={s.window.x + line * 4} y={up(s.window.y + s.step.y) + Math.min(s.step.y, s.step.x) * 0.22} fontSize={Math.min(s.step.y, s.step.x) * 0.2} className="fill-chalk-700 select-none">
            {s.name}
          </text>
        </g>
      ))}
      {input.frames.map((f) => (
        <g key={f.id}>
          <polygon points={points(f.outlineMm)} className="fill-none stroke-ink-900" strokeWidth={line * 1.6} />
          {f.hangers.map((h) => (
            <circle key={h.id} cx={h.x} cy={up(h.y)} r={line * 3.5} className="fill-brass-600" />
          ))}
        </g>
      ))}
    </svg>
  );
}
