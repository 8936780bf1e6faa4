import { DxfWriter, LWPolylineFlags, point2d, point3d, Units } from '@tarikjabiri/dxf';
import { LAYERS, type Layer, type Shape } from './linework';

/** Height of letters, mm on the floor: 2.4 mm on a plot at 1:50. */
const LETTER_MM = 120;
const SPOT_RADIUS_MM = 25;

/** Colour numbers of the index that every reader of DXF knows (from memory): 1 red, 3 green, 5 blue, 7 black or white, 8 grey. */
const COLOURS: Record<Layer, number> = {
  WALKWAYS: 8,
  ZONES: 6,
  CONVEYORS: 7,
  'PROTECTIVE-DEVICES': 30,
  OBSTACLES: 8,
  FIXTURES: 7,
  'GUARD-LINES': 1,
  REACH: 8,
  ROBOTS: 7,
  'TASK-POINTS': 3,
  DIMENSIONS: 5,
  SECTIONS: 5,
  NOTES: 7,
  NAMES: 7,
};

/**
 * Linework as a DXF drawing in millimetres, the floor frame as its world: x right, y away. One layer a kind of thing; heights stand in
 * the elevation. Coordinates keep every digit.
 */
export function dxfOf(shapes: readonly Shape[]): string {
  const dxf = new DxfWriter();
  dxf.setUnits(Units.Millimeters);
  for (const layer of LAYERS) dxf.addLayer(layer, COLOURS[layer], 'Continuous');
  for (const shape of shapes) {
    const layerName = shape.layer;
    switch (shape.kind) {
      case 'line':
        dxf.addLWPolyline(
          shape.points.map(([x, y]) => ({ point: point2d(x, y) })),
          {
            layerName,
            elevation: shape.zMm,
            flags: shape.closed ? LWPolylineFlags.Closed : LWPolylineFlags.None,
          },
        );
        break;
      case 'circle':
        dxf.addCircle(point3d(...shape.centre, shape.zMm), shape.radiusMm, { layerName });
        break;
      case 'spot':
        dxf.addPoint(...shape.at, { layerName });
        dxf.addCircle(point3d(...shape.at), SPOT_RADIUS_MM, { layerName });
        dxf.addText(point3d(shape.at[0] + 1.5 * SPOT_RADIUS_MM, shape.at[1], 0), LETTER_MM / 2, plainText(shape.name), {
          layerName,
        });
        break;
      case 'words':
        dxf.addText(point3d(...shape.at, 0), shape.heightMm ?? LETTER_MM, plainText(shape.text), {
          layerName,
          rotation: shape.angleDeg,
        });
        break;
    }
  }
  return dxf.stringify();
}

/** A line break would end the value and let a name write groups of its own; other characters beyond ASCII as \U+XXXX. */
function plainText(text: string): string {
  return Array.from(text.replace(/[\p{Cc}\u2028\u2029]+/gu, ' '), (character) => {
    const code = character.codePointAt(0) ?? 0;
    if (code < 127) return character;
    return code > 0xffff ? '?' : `\\U+${code.toString(16).toUpperCase().padStart(4, '0')}`;
  }).join('');
}
