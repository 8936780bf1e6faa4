import { describe, expect, it } from 'vitest';
import { KernelDesk } from './kernel-desk';

const job = (slot: string, key: string) => ({ slot, key, task: `${slot}${key}` });

function desk() {
  const sent: string[] = [];
  const kept = new KernelDesk<string, string>((task) => sent.push(task));
  return { sent, kept };
}

describe('the desk of the kernel', () => {
  it('computes the newest wish only, and keeps the last answer meanwhile', () => {
    const { sent, kept } = desk();
    kept.want([job('r1', 'a')]);
    kept.want([job('r1', 'b')]);
    kept.want([job('r1', 'c')]);
    expect(sent).toEqual(['r1a']);
    kept.take('A');
    expect(kept.getAnswers().get('r1')).toEqual({ key: 'a', result: 'A' });
    expect(sent).toEqual(['r1a', 'r1c']);
    kept.take('C');
    expect(kept.getAnswers().get('r1')).toEqual({ key: 'c', result: 'C' });
    expect(sent).toHaveLength(2);
  });

  it('gives every slot its turn', () => {
    const { sent, kept } = desk();
    for (const round of ['1', '2', '3', '4']) {
      kept.want([job('r1', round), job('r2', round)]);
      if (round !== '1') kept.take('done');
    }
    expect(sent).toEqual(['r11', 'r22', 'r13', 'r24']);
  });

  it('drops answers nobody wants any more, also those that come late', () => {
    const { kept } = desk();
    let told = 0;
    kept.subscribe(() => (told += 1));
    kept.want([job('r1', 'a')]);
    kept.want([]);
    kept.take('A');
    expect(kept.getAnswers().size).toBe(0);
    expect(told).toBe(0);
  });

  it('goes on after a job that failed, without asking it again', () => {
    const { sent, kept } = desk();
    kept.want([job('r1', 'a'), job('r2', 'a')]);
    kept.fail();
    kept.take('A2');
    expect(sent).toEqual(['r1a', 'r2a']);
    kept.want([job('r1', 'b')]);
    expect(sent).toEqual(['r1a', 'r2a', 'r1b']);
  });
});
