'use client';

import { useBoard } from '@/components/sheet/editor/board-context';
import { useItemEdit } from '@/components/sheet/panels/use-item-edit';
import { ValueField } from '@/components/sheet/panels/value-field';
import { Checkbox } from '@/components/ui/checkbox';
import { partSchema, type Robot } from '@/lib/layout/items';
import { checkPayload, type PayloadCheck, type RatedFigure } from '@/lib/layout/payload';

type Body = Pick<Robot['tool'], 'centreMm' | 'inertiaKgM2'>;

/** What the robot carries, and tool plus part against the rating of its arm. */
export function PayloadFields({ robot }: { readonly robot: Robot }) {
  const { arms } = useBoard();
  const edit = useItemEdit(robot);
  const { part, tool, wristRating, locked } = robot;
  const check = checkPayload(robot, arms.get(robot.armId)?.payloadKg ?? null);
  const setPart = (patch: object) => edit('Part', { part: partSchema.parse({ massKg: 0, ...part, ...patch }) });
  return (
    <section aria-label="Payload" className="mt-3 border-t border-hair pt-2">
      <h3 className="text-[0.8125rem] font-medium text-ink-soft">Payload</h3>
      <Checkbox
        label="It carries a part"
        checked={part !== null}
        disabled={locked}
        onCheckedChange={(carries) => edit('Part', { part: carries ? partSchema.parse({ massKg: 0 }) : null })}
      />
      {part && (
        <div className="grid grid-cols-3 gap-x-3 gap-y-1.5">
          <ValueField
            label="Part mass"
            kind="number"
            unit="kg"
            step={0.5}
            value={part.massKg}
            disabled={locked}
            onCommit={(massKg) => (massKg < 0 || massKg > 5000 ? 'Write 0 to 5000 kg.' : setPart({ massKg }))}
          />
          <ValueField
            label="Stands out by"
            kind="length"
            value={part.radiusMm}
            disabled={locked}
            onCommit={(radiusMm) => (radiusMm < 0 || radiusMm > 20_000 ? 'Write 0 to 20 m.' : setPart({ radiusMm }))}
          />
        </div>
      )}
      <details className="mt-1.5">
        <summary className="text-sm text-ink-soft hover:text-petrol">
          Centres of mass, inertia, rating of the wrist
        </summary>
        <BodyFields
          what="Tool"
          body={tool}
          locked={locked}
          onChange={(patch) => edit('Tool', { tool: { ...tool, ...patch } })}
        />
        {part && <BodyFields what="Part" body={part} locked={locked} onChange={setPart} />}
        <Checkbox
          label="The data sheet rates the wrist"
          checked={wristRating !== null}
          disabled={locked}
          onCheckedChange={(rated) =>
            edit('Wrist rating', { wristRating: rated ? { momentNm: null, inertiaKgM2: null } : null })
          }
        />
        {wristRating && (
          <div className="grid grid-cols-2 gap-x-3">
            <ValueField
              label="Moment allowed"
              kind="number"
              unit="N m"
              step={1}
              value={wristRating.momentNm ?? 0}
              disabled={locked}
              onCommit={(value) =>
                value < 0
                  ? 'A rating is above zero; write 0 where it is not known.'
                  : edit('Wrist rating', { wristRating: { ...wristRating, momentNm: value === 0 ? null : value } })
              }
            />
            <ValueField
              label="Inertia allowed"
              kind="number"
              unit="kg m²"
              step={0.1}
              value={wristRating.inertiaKgM2 ?? 0}
              disabled={locked}
              onCommit={(value) =>
                value < 0
                  ? 'A rating is above zero; write 0 where it is not known.'
                  : edit('Wrist rating', { wristRating: { ...wristRating, inertiaKgM2: value === 0 ? null : value } })
              }
            />
          </div>
        )}
      </details>
      <Outcome check={check} />
    </section>
  );
}

const CENTRE = [
  ['xMm', 'x'],
  ['yMm', 'y'],
  ['zMm', 'z'],
] as const;
const INERTIA = [
  ['xx', 'about x'],
  ['yy', 'about y'],
  ['zz', 'about z'],
] as const;

interface BodyFieldsProps {
  readonly what: 'Tool' | 'Part';
  readonly body: Body;
  readonly locked: boolean;
  readonly onChange: (patch: Partial<Body>) => string | null;
}

function BodyFields({ what, body, locked, onChange }: BodyFieldsProps) {
  const { centreMm, inertiaKgM2 } = body;
  return (
    <>
      <Checkbox
        label={`${what}: centre of mass known, from the flange`}
        checked={centreMm !== null}
        disabled={locked}
        onCheckedChange={(known) => onChange({ centreMm: known ? { xMm: 0, yMm: 0, zMm: 0 } : null })}
      />
      {centreMm && (
        <div className="grid grid-cols-3 gap-x-3">
          {CENTRE.map(([key, axis]) => (
            <ValueField
              key={key}
              label={`${what} centre, ${axis}`}
              kind="length"
              value={centreMm[key]}
              disabled={locked}
              onCommit={(value) => onChange({ centreMm: { ...centreMm, [key]: value } })}
            />
          ))}
        </div>
      )}
      <Checkbox
        label={`${what}: inertia about its centre known`}
        checked={inertiaKgM2 !== null}
        disabled={locked}
        onCheckedChange={(known) => onChange({ inertiaKgM2: known ? { xx: 0, yy: 0, zz: 0 } : null })}
      />
      {inertiaKgM2 && (
        <div className="grid grid-cols-3 gap-x-3">
          {INERTIA.map(([key, about]) => (
            <ValueField
              key={key}
              label={`${what} ${about}`}
              kind="number"
              unit="kg m²"
              step={0.01}
              value={inertiaKgM2[key]}
              disabled={locked}
              onCommit={(value) =>
                value < 0 ? 'An inertia is 0 or more.' : onChange({ inertiaKgM2: { ...inertiaKgM2, [key]: value } })
              }
            />
          ))}
        </div>
      )}
    </>
  );
}

function Outcome({ check }: { readonly check: PayloadCheck }) {
  return (
    <div className="mt-1.5 text-sm">
      <Rated label="Tool and part" figure={check.massKg} unit="kg" digits={1} />
      {check.momentNm && <Rated label="Moment at the flange" figure={check.momentNm} unit="N m" digits={1} />}
      {check.inertiaKgM2 && <Rated label="Inertia at the flange" figure={check.inertiaKgM2} unit="kg m²" digits={3} />}
      {check.questions.map(({ field, words }) => (
        <p key={field} className="text-amber">
          {words}
        </p>
      ))}
      <p className="text-[0.8125rem] leading-4.5 text-ink-soft">{check.caution}</p>
    </div>
  );
}

interface RatedProps {
  readonly label: string;
  readonly figure: RatedFigure;
  readonly unit: string;
  readonly digits: number;
}

function Rated({ label, figure: { value, rated, margin }, unit, digits }: RatedProps) {
  const isOver = margin !== null && margin < 0;
  return (
    <p className={isOver ? 'text-red' : undefined}>
      {label}: <span className="font-mono">{value.toFixed(digits)}</span> {unit}
      {rated !== null && margin !== null && (
        <>
          {' '}
          of {rated} {unit}, {Math.abs(margin).toFixed(digits)} {unit} {isOver ? 'over' : 'to spare'}
        </>
      )}
    </p>
  );
}
