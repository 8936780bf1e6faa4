/**
 * Where a text stops being JSON (RFC 8259). JSON.parse says that it does, but names the place only for some faults, and differently in
 * every version of the engine.
 */

const TOKEN =
  /[ \t\r\n]*(?:("[^"\\\u0000-\u001f]*(?:\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})[^"\\\u0000-\u001f]*)*")|(-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?|true|false|null)|([{}[\],:]))/y;

type Wanted = 'value' | 'value or ]' | 'key' | 'key or }' | ':' | ', or end' | 'nothing';

/** Offset of the first character that cannot stand where it stands; the length of the text where it only ends too soon. */
export function jsonFaultAt(text: string): number {
  const open: ('{' | '[')[] = [];
  let wanted: Wanted = 'value';
  let at = 0;
  const closed = (): Wanted => (open.length > 0 ? ', or end' : 'nothing');
  while (true) {
    TOKEN.lastIndex = at;
    const found = TOKEN.exec(text);
    if (!found) return at + (/^[ \t\r\n]*/.exec(text.slice(at))?.[0].length ?? 0);
    const [whole, string, scalar, sign] = found;
    const start = at + whole.length - (string ?? scalar ?? sign).length;
    const isValueWanted: boolean = wanted === 'value' || wanted === 'value or ]';
    const isKeyWanted: boolean = wanted === 'key' || wanted === 'key or }';
    if (string !== undefined && isKeyWanted) wanted = ':';
    else if ((string ?? scalar) !== undefined && isValueWanted) wanted = closed();
    else if ((sign === '{' || sign === '[') && isValueWanted) {
      open.push(sign);
      wanted = sign === '{' ? 'key or }' : 'value or ]';
    } else if (sign === ':' && wanted === ':') wanted = 'value';
    else if (sign === ',' && wanted === ', or end') wanted = open[open.length - 1] === '{' ? 'key' : 'value';
    else if (closes(sign, open[open.length - 1], wanted)) {
      open.pop();
      wanted = closed();
    } else return start;
    at += whole.length;
  }
}

function closes(sign: string | undefined, opened: '{' | '[' | undefined, wanted: Wanted): boolean {
  if (sign === '}') return opened === '{' && (wanted === ', or end' || wanted === 'key or }');
  return sign === ']' && opened === '[' && (wanted === ', or end' || wanted === 'value or ]');
}

/** `line 3, column 13`, both counted from 1. */
export function placeInText(text: string, at: number): string {
  const before = text.slice(0, at).split('\n');
  return `line ${before.length}, column ${before[before.length - 1].length + 1}`;
}
