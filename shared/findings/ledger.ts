import RBush from 'rbush';
import type { Frame, LayoutPattern, LayoutSheet } from '../layouts/layout.ts';
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

const told = (rule: Rule, found: Found): Finding => ({
  id: `${rule.id}: ${found.about}`, rule: rule.id, title: rule.title, source: rule.source, weight: found.weight, words: found.words,
  frameIds: found.frameIds, hangerIds: found.hangerIds ?? [], figures: found.figures ?? [],
});

interface Entry { minX: number; minY: number; maxX: number; maxY: number; placed: PlacedFrame }

/**
 * Works out findings, and on the next call only for what changed: frames, patterns and surroundings are compared by identity, so callers
 * keep what did not change as the same object. One keeper serves one layout.
 */
export function createLedger(): (scene: Scene) => Ledger {
  let around: Surroundings | null = null;
  let sheet: LayoutSheet | null = null;
  const frames = new Map<string, { frame: Frame; pattern: LayoutPattern; placed: PlacedFrame; findings: Finding[]; entry: Entry }>();
  const pairs = new Map<string, { a: PlacedFrame; b: PlacedFrame; findings: Finding[] }>();
  const bodies = new Map<string, { members: readonly PlacedFrame[]; body: AssessedBody; findings: Finding[] }>();
  const patterns = new Map<string, { pattern: LayoutPattern; found: { rule: PatternRule; found: Omit<Found, 'frameIds'> }[] }>();
  let index = new RBush<Entry>();

  function forget(): void {
    frames.clear();
    pairs.clear();
    bodies.clear();
    patterns.clear();
    index = new RBush<Entry>();
  }

  return (scene) => {
    if (!around || around.wall !== scene.wall || around.book !== scene.book || around.limits !== scene.limits) {
      around = { wall: scene.wall, book: scene.book, limits: scene.limits };
      forget();
    }
    if (sheet !== scene.sheet) pairs.clear();
    sheet = scene.sheet;
    const byId = new Map(scene.patterns.map((p) => [p.id, p]));
    const placedNow = placeAll(scene.frames, byId, around);
    const findings = [
      ...placedNow.flatMap((p) => frames.get(p.frame.id)!.findings),
      ...pairFindings(placedNow, scene.sheet, around),
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
        if (known) index.remove(known.entry);
        const placed = placeFrame(frame, pattern);
        const { left, bottom, right, top } = placed.box;
        known = { frame, pattern, placed, entry: { minX: left, minY: bottom, maxX: right, maxY: top, placed }, findings: frameRules.flatMap((rule) => rule.check(placed, env).map((f) => told(rule, f))) };
        index.insert(known.entry);
        frames.set(frame.id, known);
      }
      result.push(known.placed);
    }
    for (const [id, gone] of frames) {
      if (seen.has(id)) continue;
      index.remove(gone.entry);
      frames.delete(id);
    }
    return result;
  }

  function pairFindings(list: readonly PlacedFrame[], on: LayoutSheet, env: Surroundings): Finding[] {
    const result: Finding[] = [];
    const seen = new Set<string>();
    for (const a of list) {
      const near = index.search({ minX: a.box.left - slimGapMm, minY: a.box.bottom - slimGapMm, maxX: a.box.right + slimGapMm, maxY: a.box.top + slimGapMm });
      for (const { placed: b } of near) {
        if (b.frame.id <= a.frame.id) continue;
        const key = `${a.frame.id}+${b.frame.id}`;
        seen.add(key);
        let known = pairs.get(key);
        if (!known || known.a !== a || known.b !== b) {
          known = { a, b, findings: pairRules.flatMap((rule) => rule.check(a, b, on, env).map((f) => told(rule, f))) };
          pairs.set(key, known);
        }
        result.push(...known.findings);
      }
    }
    for (const key of pairs.keys()) if (!seen.has(key)) pairs.delete(key);
    return result;
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

/** Stops first, then cautions, then notes; within a weight by rule. */
function inOrder(findings: Finding[]): Finding[] {
  return findings.sort((a, b) => weights.indexOf(a.weight) - weights.indexOf(b.weight) || (rank.get(a.rule) ?? 0) - (rank.get(b.rule) ?? 0));
}
