import { REFERENCE_ARMS } from './arms';

/**
 * The input of generate.py. To make the committed file anew, from the top of the checkout:
 *   node --import tsx tests/reference/print-arms.ts | /usr/bin/python3 tests/reference/generate.py 40 > tests/reference/reference.json
 */
process.stdout.write(JSON.stringify(REFERENCE_ARMS));
