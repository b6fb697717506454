import Centroid from 'jsts/org/locationtech/jts/algorithm/Centroid.js';
import GeometryFactory from 'jsts/org/locationtech/jts/geom/GeometryFactory.js';
import Coordinate from 'jsts/org/locationtech/jts/geom/Coordinate.js';
import BufferOp from 'jsts/org/locationtech/jts/operation/buffer/BufferOp.js';
import BufferParameters from 'jsts/org/locationtech/jts/operation/buffer/BufferParameters.js';
import OverlayOp from 'jsts/org/locationtech/jts/operation/overlay/OverlayOp.js';
import DistanceOp from 'jsts/org/locationtech/jts/operation/distance/DistanceOp.js';
import type { Polygon } from '../../../shared/geometry/polygon.ts';

/** The same questions put to JTS (by its JavaScript port), a general library of plane geometry that shares no code with ours. */
const factory = new GeometryFactory();

function toJts(polygon: Polygon) {
  const corners = [...polygon, polygon[0]!].map(({ x, y }) => new Coordinate(x, y));
  return factory.createPolygon(factory.createLinearRing(corners), []);
}

export const jtsArea = (polygon: Polygon): number => toJts(polygon).getArea();
export const jtsOverlap = (a: Polygon, b: Polygon): number => OverlayOp.intersection(toJts(a), toJts(b)).getArea();
export const jtsDistance = (a: Polygon, b: Polygon): number => DistanceOp.distance(toJts(a), toJts(b));
export function jtsCentroid(polygon: Polygon): { x: number; y: number } {
  const at = Centroid.getCentroid(toJts(polygon));
  return { x: at.getX(), y: at.getY() };
}

/** Area of the polygon drawn in (below zero) or out, with sharp corners. */
export function jtsBufferArea(polygon: Polygon, mm: number): number {
  const sharp = new BufferParameters(1, BufferParameters.CAP_FLAT, BufferParameters.JOIN_MITRE, 1000);
  sharp.setSimplifyFactor(0);
  return BufferOp.bufferOp(toJts(polygon), mm, sharp).getArea();
}
