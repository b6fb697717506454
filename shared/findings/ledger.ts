import RBush from 'rbush';
import type { Frame, LayoutPattern, LayoutSheet } from '../layouts/layout.ts';
import type { Figure } from '../units/figure.ts';
import { weights, type Finding, type Found } from './finding.ts';
import { assessBody, type AssessedBody } from './hung-body.ts';
import { placeFrame, type PlacedFrame } from './placed-frame.ts';
import type { BodyRule, FrameRule, LayoutRule, PairRule, PatternRule, Rule } from './rule.ts';
import { rules } from './rules.ts';
import { slimGapMm } from './rules/nearly-touching.ts';
import type { Scene, Surroundings } from './scene.ts';

/** What the ledger shows of a layout. */
export interface Ledger {
  findings: Finding[];
  frames: PlacedFrame[];
  bodies: AssessedBody[];
}

const of = <K extends Rule['of']>(kind: K) => rules.filter((r): r is Extract<Rule, { of: K }> => r.of === kind);
const frameRules: FrameRule[] = of('frame');
const pairRules: PairRule[] = of('pair');
const patternRules: PatternRule[] = of('pattern');
const bodyRules: BodyRule[] = of('body');
const layoutRules: LayoutRule[] = of('layout');

function told(rule: Rule, found: Found): Finding {
  const { figures } = found;
  let made: readonly Figure[] | null = typeof figures === 'function' ? null : (figures ?? []);
  return {
    id: `${rule.id}: ${found.about}`, rule: rule.id, title: rule.title, source: rule.source, weight: found.weight, words: found.words,
    frameIds: found.frameIds, hangerIds: found.hangerIds ?? [],
    get figures() {
      return (made ??= typeof figures === 'function' ? figures() : []);
    },
  };
}

interface Entry { minX: number; minY: number; maxX: number; maxY: number; placed: PlacedFrame }

/**
 * Works out findings, and on the next call only for what changed: frames, patterns and surroundings are compared by identity, so callers
 * keep what did not change as the same object. One keeper serves one layout.
 */
export function createLedger(): (scene: Scene) => Ledger {
  let around: Surroundings | null = null;
  let sheet: LayoutSheet | null = null;
  const frames = new Map<string, { frame: Frame; pattern: LayoutPattern; placed: PlacedFrame; findings: Finding[]; entry: Entry }>();
  /** Findings of frames that are near one another, under the frame and the other's id; pairs without a finding are not kept. */
  const pairs = new Map<PlacedFrame, Map<string, Finding[]>>();
  let changed = new Set<PlacedFrame>();
  const bodies = new Map<string, { members: readonly PlacedFrame[]; body: AssessedBody; findings: Finding[] }>();
  const patterns = new Map<string, { pattern: LayoutPattern; found: { rule: PatternRule; found: Omit<Found, 'frameIds'> }[] }>();
  let index = new RBush<Entry>();

  function forget(): void {
    frames.clear();
    pairs.clear();
    changed = new Set();
    bodies.clear();
    patterns.clear();
    index = new RBush<Entry>();
  }

  return (scene) => {
    if (!around || around.wall !== scene.wall || around.book !== scene.book || around.limits !== scene.limits) {
      around = { wall: scene.wall, book: scene.book, limits: scene.limits };
      forget();
    }
    const sheetChanged = sheet !== scene.sheet;
    sheet = scene.sheet;
    const byId = new Map(scene.patterns.map((p) => [p.id, p]));
    const placedNow = placeAll(scene.frames, byId, around);
    if (sheetChanged) {
      pairs.clear();
      changed = new Set(placedNow);
    }
    const findings = [
      ...placedNow.flatMap((p) => frames.get(p.frame.id)!.findings),
      ...pairFindings(scene.sheet, around),
      ...bodyFindings(placedNow, around),
      ...patternFindings(placedNow, around),
      ...layoutRules.flatMap((rule) => rule.check(scene).map((f) => told(rule, f))),
    ];
    return { findings: inOrder(findings), frames: placedNow, bodies: [...bodies.values()].map((b) => b.body) };
  };

  function placeAll(list: readonly Frame[], byId: Map<string, LayoutPattern>, env: Surroundings): PlacedFrame[] {
    const seen = new Set<string>();
    const result: PlacedFrame[] = [];
    for (const frame of list) {
      const pattern = byId.get(frame.patternId);
      if (!pattern) continue;
      seen.add(frame.id);
      let known = frames.get(frame.id);
      if (!known || known.frame !== frame || known.pattern !== pattern) {
        if (known) takeOut(known);
        const placed = placeFrame(frame, pattern);
        const { left, bottom, right, top } = placed.box;
        known = { frame, pattern, placed, entry: { minX: left, minY: bottom, maxX: right, maxY: top, placed }, findings: frameRules.flatMap((rule) => rule.check(placed, env).map((f) => told(rule, f))) };
        index.insert(known.entry);
        changed.add(placed);
        frames.set(frame.id, known);
      }
      result.push(known.placed);
    }
    for (const [id, gone] of frames) {
      if (seen.has(id)) continue;
      takeOut(gone);
      frames.delete(id);
    }
    return result;
  }

  function takeOut({ placed, entry }: { placed: PlacedFrame; entry: Entry }): void {
    index.remove(entry);
    changed.delete(placed);
    for (const other of pairs.get(placed)?.keys() ?? []) {
      const its = frames.get(other);
      if (its) pairs.get(its.placed)?.delete(placed.frame.id);
    }
    pairs.delete(placed);
  }

  /** Only what changed is held against its neighbours; what two frames that stayed had to say to one another stands. */
  function pairFindings(on: LayoutSheet, env: Surroundings): Finding[] {
    for (const placed of changed) {
      const { left, bottom, right, top } = placed.box;
      for (const { placed: other } of index.search({ minX: left - slimGapMm, minY: bottom - slimGapMm, maxX: right + slimGapMm, maxY: top + slimGapMm })) {
        if (other === placed || (changed.has(other) && other.frame.id < placed.frame.id)) continue;
        const [a, b] = placed.frame.id < other.frame.id ? [placed, other] : [other, placed];
        const found = pairRules.flatMap((rule) => rule.check(a, b, on, env).map((f) => told(rule, f)));
        if (found.length === 0) continue;
        keep(a, b.frame.id, found);
        keep(b, a.frame.id, found);
      }
    }
    changed.clear();
    const result: Finding[] = [];
    for (const [placed, others] of pairs) for (const [id, found] of others) if (placed.frame.id < id) result.push(...found);
    return result;
  }

  function keep(of: PlacedFrame, other: string, found: Finding[]): void {
    let others = pairs.get(of);
    if (!others) pairs.set(of, (others = new Map()));
    others.set(other, found);
  }

  function bodyFindings(list: readonly PlacedFrame[], env: Surroundings): Finding[] {
    const groups = new Map<string, PlacedFrame[]>();
    for (const p of list) {
      const id = p.frame.hungGroup === null ? `frame ${p.frame.id}` : `group ${p.frame.hungGroup}`;
      const group = groups.get(id);
      if (group) group.push(p);
      else groups.set(id, [p]);
    }
    for (const id of bodies.keys()) if (!groups.has(id)) bodies.delete(id);
    const result: Finding[] = [];
    for (const [id, members] of groups) {
      let known = bodies.get(id);
      if (!known || known.members.length !== members.length || known.members.some((m, i) => m !== members[i])) {
        const body = assessBody(id, members, env);
        known = { members, body, findings: bodyRules.flatMap((rule) => rule.check(body, env).map((f) => told(rule, f))) };
        bodies.set(id, known);
      }
      result.push(...known.findings);
    }
    return result;
  }

  function patternFindings(list: readonly PlacedFrame[], env: Surroundings): Finding[] {
    const users = new Map<LayoutPattern, string[]>();
    for (const { pattern, frame } of list) {
      const ids = users.get(pattern);
      if (ids) ids.push(frame.id);
      else users.set(pattern, [frame.id]);
    }
    return [...users].flatMap(([pattern, frameIds]) => {
      let known = patterns.get(pattern.id);
      if (known?.pattern !== pattern) {
        known = { pattern, found: patternRules.flatMap((rule) => rule.check(pattern, env).map((found) => ({ rule, found }))) };
        patterns.set(pattern.id, known);
      }
      return known.found.map(({ rule, found }) => told(rule, { ...found, frameIds }));
    });
  }
}

/** Findings of a layout, worked out once. */
export const findingsOf = (scene: Scene): Finding[] => createLedger()(scene).findings;

const rank = new Map(rules.map((r, i) => [r.id, i]));

/** Stops first, then cautions, then notes; within a weight by rule, and of one rule as they came. */
function inOrder(findings: Finding[]): Finding[] {
  const drawers = new Map<number, Finding[]>();
  for (const finding of findings) {
    const place = weights.indexOf(finding.weight) * rules.length + (rank.get(finding.rule) ?? 0);
    const drawer = drawers.get(place);
    if (drawer) drawer.push(finding);
    else drawers.set(place, [finding]);
  }
  return [...drawers].sort((a, b) => a[0] - b[0]).flatMap(([, list]) => list);
}
