const TEST_KINDS = ['unit', 'components', 'integration', 'browser'];
const CHECKS = ['lint', 'types'];

/**
 * What `npm test` is asked for: kinds by name, files, `--keep`. Files without a kind say by themselves which one they are;
 * nothing at all means everything.
 */
export function readPlan(words) {
  const keep = words.includes('--keep');
  const named = words.filter((word) => [...CHECKS, ...TEST_KINDS].includes(word));
  const files = words.filter((word) => !named.includes(word) && word !== '--keep');
  const everything = [...CHECKS, ...TEST_KINDS];
  const kinds = new Set(named.length > 0 ? named : files.length > 0 ? files.map(kindOf) : everything);
  const wants = (kind) => kinds.has(kind);
  return {
    keep,
    files,
    wants,
    wantsTests: TEST_KINDS.some(wants),
    wantsServices: keep || wants('integration') || wants('browser'),
  };
}

function kindOf(file) {
  if (file.includes('tests/browser')) return 'browser';
  if (file.includes('tests/integration')) return 'integration';
  return file.endsWith('.tsx') || file.startsWith('components') ? 'components' : 'unit';
}
