const FLOOR = 640;
const SHOULDER = { x: 330, y: 400 };
const UPPER = 190;
const FORE = 205;

/** Elbow and wrist for the angles of the two links above the horizontal, degrees. */
function posture(shoulderDeg: number, elbowDeg: number) {
  const at = (from: { x: number; y: number }, length: number, deg: number) => ({
    x: from.x + length * Math.cos((deg * Math.PI) / 180),
    y: from.y - length * Math.sin((deg * Math.PI) / 180),
  });
  const elbow = at(SHOULDER, UPPER, shoulderDeg);
  const wrist = at(elbow, FORE, elbowDeg);
  return { elbow, wrist, tool: { x: wrist.x, y: wrist.y + 62 } };
}

const arc = (radius: number, fromDeg: number, toDeg: number): string => {
  const point = (deg: number): string =>
    `${(SHOULDER.x + radius * Math.cos((deg * Math.PI) / 180)).toFixed(1)} ${(SHOULDER.y - radius * Math.sin((deg * Math.PI) / 180)).toFixed(1)}`;
  return `M${point(fromDeg)}A${radius} ${radius} 0 0 0 ${point(toDeg)}`;
};

/** An arm in elevation on its riser, with its reach: line work only, for the pages before sign-in. */
export function ArmElevation({ className }: { className?: string }) {
  const now = posture(66, -28);
  const before = posture(101, 8);
  const path = `M${SHOULDER.x} ${SHOULDER.y}L${now.elbow.x} ${now.elbow.y}L${now.wrist.x} ${now.wrist.y}L${now.tool.x} ${now.tool.y}`;
  const ghost = `M${SHOULDER.x} ${SHOULDER.y}L${before.elbow.x} ${before.elbow.y}L${before.wrist.x} ${before.wrist.y}L${before.tool.x} ${before.tool.y}`;
  const reach = UPPER + FORE;
  return (
    <svg viewBox="-60 -40 1330 800" aria-hidden className={className} fill="none" preserveAspectRatio="xMinYMid meet">
      <g stroke="var(--hair)">
        {Array.from({ length: 30 }, (_, index) => (
          <path key={index} d={`M${-240 + index * 80} -600V1400M-1000 ${-480 + index * 80}H2400`} />
        ))}
      </g>
      <g stroke="var(--petrol)" strokeWidth="1.4">
        <path d={arc(reach, -28, 152)} />
        <path d={arc(150, -28, 152)} strokeDasharray="7 5" />
        <path d={arc(reach * 0.72, -14, 118)} strokeOpacity="0.4" />
        <path d={arc(reach * 0.86, -20, 132)} strokeOpacity="0.4" />
      </g>
      <path d={`M-1000 ${FLOOR}H2400`} stroke="var(--ink)" strokeWidth="2" />
      <path
        d={Array.from({ length: 140 }, (_, index) => `M${-520 + index * 22} ${FLOOR}l-11 13`).join('')}
        stroke="var(--ink-soft)"
      />
      <path d={`M-1000 ${now.tool.y.toFixed(1)}H2400`} stroke="var(--red)" strokeDasharray="9 6" />
      <text x="770" y={now.tool.y - 9} fill="var(--red)" className="font-mono text-[15px]" textAnchor="end">
        z 850
      </text>
      <g stroke="var(--ink)" strokeWidth="1.6" fill="var(--sheet)">
        <rect x="286" y="560" width="88" height={FLOOR - 560} />
        <path d={`M286 560L374 ${FLOOR}M374 560L286 ${FLOOR}`} strokeWidth="0.7" />
        <path d={`M296 560V${SHOULDER.y + 34}l12 -34h44l12 34V560z`} />
      </g>
      <path d={ghost} stroke="var(--ink-soft)" strokeDasharray="3 5" strokeWidth="1.2" />
      <Link path={path} />
      {[SHOULDER, now.elbow, now.wrist].map((joint, index) => (
        <circle
          key={index}
          cx={joint.x}
          cy={joint.y}
          r={index === 0 ? 20 : 13}
          fill="var(--sheet)"
          stroke="var(--ink)"
          strokeWidth="2"
        />
      ))}
      <circle cx={SHOULDER.x} cy={SHOULDER.y} r="7" stroke="var(--ink)" strokeWidth="1.6" />
      <circle cx={now.tool.x} cy={now.tool.y} r="7" fill="var(--red)" />
      <g stroke="var(--ink)" strokeWidth="1.2">
        <path d={`M${SHOULDER.x} 668V712M${SHOULDER.x + reach} 420V712`} strokeWidth="0.8" />
        <path d={`M${SHOULDER.x} 702H${SHOULDER.x + reach}`} />
      </g>
      <path d={`M${SHOULDER.x} 702l14 -4v8zM${SHOULDER.x + reach} 702l-14 -4v8z`} fill="var(--ink)" />
      <text x={SHOULDER.x + reach / 2} y="693" fill="var(--ink)" textAnchor="middle" className="font-mono text-[17px]">
        1420
      </text>
    </svg>
  );
}

/** A link as a body: an ink outline with paper inside. */
function Link({ path }: { path: string }) {
  return (
    <g strokeLinecap="round" strokeLinejoin="round">
      <path d={path} stroke="var(--ink)" strokeWidth="25" />
      <path d={path} stroke="var(--sheet)" strokeWidth="21" />
    </g>
  );
}
