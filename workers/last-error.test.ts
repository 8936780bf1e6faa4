import { describe, expect, it } from 'vitest';
import { lastErrorOf } from './last-error';

describe('the last error of a job', () => {
  it('is told as a sentence, wherever the queue has put it', () => {
    expect(lastErrorOf({ message: 'The thread is gone', stack: '…' })).toBe('The thread is gone.');
    expect(lastErrorOf({ value: { message: 'No memory is left.' } })).toBe('No memory is left.');
  });

  it('says in plain words what the queue says of a lost worker', () => {
    for (const message of [
      'job failed by timeout in active state',
      'handler execution exceeded 20000ms',
      'pg-boss shut down while active',
    ]) {
      expect(lastErrorOf({ value: { message } })).toBe('its worker was stopped, or took too long.');
    }
  });

  it('may have left no message', () => {
    for (const output of [null, {}, { value: 'gone' }, { message: '' }]) {
      expect(lastErrorOf(output)).toBe('it left no message.');
    }
  });
});
