import { KERNEL_VERSION } from '@/lib/kinematics/version';
import type { Arm } from '@/lib/kinematics/types';
import { directionWords, MEASURE_WORDS, wristWords } from '@/lib/layout/measure-words';
import type { ReportSheet } from '../report-sheet';
import type { Flow, FlowCell } from './flow';

const figure = (value: number, decimals = 1): string => value.toFixed(decimals).replace('-', '−');
const degrees = (angleRad: number): string => figure((angleRad * 180) / Math.PI, 0);

/** What the figures rest on: the question of the maps, the floor plan's scale, and the data of every arm. */
export function assumptionPages(flow: Flow, sheet: ReportSheet): void {
  flow.heading('Assumptions');
  const { mapSettings, floorPlan, items, arms } = sheet.snapshot;
  flow.facts([
    ['Map', `${MEASURE_WORDS[mapSettings.measure].name}, the best robot a spot`],
    ['Tool', `${directionWords(mapSettings)}, height ${mapSettings.toolHeightMm} mm, ${wristWords(mapSettings)}`],
    ['Grid', `${mapSettings.stepMm} mm from spot to spot`],
    ['Computation', `kernel version ${KERNEL_VERSION}; arms as rigid chains: no dynamics, no payload, no cables`],
    ['Floor plan', floorPlanWords(floorPlan)],
  ]);
  const robots = items.flatMap((item) => (item.kind === 'robot' ? [item] : []));
  if (robots.length > 0) {
    flow.table(
      [
        { title: 'Robot', share: 0.8 },
        { title: 'Arm', share: 2.4 },
        { title: 'Base x, y on the floor, mm', share: 1.5, figures: true },
        { title: 'Turn °', share: 0.7, figures: true },
        { title: 'Riser mm', share: 0.8, figures: true },
        { title: 'Tool', share: 1.3 },
        { title: 'Tool point from the flange x, y, z, mm', share: 1.6, figures: true },
        { title: 'Tool roll, pitch, yaw, °', share: 1.3, figures: true },
        { title: 'Tool mass kg', share: 0.8, figures: true },
      ],
      robots.map((robot): FlowCell[] => {
        const arm = arms.find(({ id }) => id === robot.armId);
        const { tool } = robot;
        return [
          { text: robot.name, face: 'sans-bold' },
          arm ? `${arm.name} (version ${arm.version})` : 'not known',
          `${figure(robot.xMm, 0)}, ${figure(robot.yMm, 0)}`,
          figure(robot.angleDeg),
          figure(robot.riserMm, 0),
          tool.name,
          [tool.xMm, tool.yMm, tool.zMm].map((value) => figure(value)).join(', '),
          [tool.rollDeg, tool.pitchDeg, tool.yawDeg].map((value) => figure(value)).join(', '),
          figure(tool.massKg),
        ];
      }),
    );
  }
  for (const arm of arms) armTable(flow, arm);
}

function floorPlanWords(floorPlan: ReportSheet['snapshot']['floorPlan']): string {
  if (!floorPlan) return 'none under this sheet';
  const { calibration, name } = floorPlan;
  if (!calibration) return `${name}, not set to scale, so it is not drawn`;
  const scale = `${name}, ${calibration.mmPerPx.toFixed(3)} mm a pixel`;
  if (calibration.checkError === null) return `${scale}; its scale was not checked against a second distance`;
  return `${scale}; a second distance of ${calibration.check?.distanceMm ?? '–'} mm differs by ${figure(calibration.checkError * 100, 2)} %`;
}

function armTable(flow: Flow, arm: { name: string; version: number; payloadKg: number | null; definition: Arm }): void {
  const payload = arm.payloadKg === null ? 'payload not stated' : `payload ${arm.payloadKg} kg as stated`;
  flow.need(60 + 15 * arm.definition.joints.length);
  flow.paragraph(`${arm.name}, version ${arm.version}; ${payload}`, { face: 'sans-bold' });
  flow.table(
    [
      { title: 'Joint', share: 0.6, figures: true },
      { title: 'Kind', share: 1 },
      { title: 'From', share: 1, figures: true },
      { title: 'To', share: 1, figures: true },
      { title: 'Greatest speed', share: 1, figures: true },
      { title: 'Greatest acceleration', share: 1.2, figures: true },
    ],
    arm.definition.joints.map((joint, index): FlowCell[] => {
      const slides = joint.type === 'prismatic';
      const length = (value: number) => (slides ? `${figure(value * 1000, 0)} mm` : `${degrees(value)}°`);
      const acceleration = joint.maxAcceleration;
      return [
        String(index + 1),
        slides ? 'slides' : 'turns',
        length(joint.min),
        length(joint.max),
        `${length(joint.maxSpeed)}/s`,
        acceleration === undefined || acceleration === null ? 'not stated' : `${length(acceleration)}/s²`,
      ];
    }),
    480,
  );
}
