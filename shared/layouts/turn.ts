/** The turn a frame of n sides takes at a press: half the angle between its corners, 360° / 2n, in radians. */
export function turnStepRad(sides: number): number {
  return Math.PI / sides;
}

/** The same turn, between −180° (left out) and 180°, in radians. */
export function plainTurnRad(turnRad: number): number {
  const turn = turnRad % (2 * Math.PI);
  if (turn > Math.PI) return turn - 2 * Math.PI;
  if (turn <= -Math.PI) return turn + 2 * Math.PI;
  return turn === 0 ? 0 : turn;
}

/** The next whole step of turning, to the left (1) or right (-1), from wherever the frame stands; a turn off the steps goes to the nearest one that way. */
export function nextStepRad(turnRad: number, sides: number, way: 1 | -1): number {
  const step = turnStepRad(sides);
  const at = (turnRad / step) * way;
  return plainTurnRad((Math.floor(at + 1e-6) + 1) * step * way);
}
