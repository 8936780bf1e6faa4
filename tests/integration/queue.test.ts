import { randomUUID } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import { afterAll, describe, expect, it } from 'vitest';
import { sequelize } from '@/lib/server/database';
import { deadLetterOf, JOBS, mailJob, mapTileJob } from '@/lib/server/jobs';
import { enqueue, enqueueAll, prepareQueues, QUEUE_SCHEMA } from '@/lib/server/queue';

afterAll(() => sequelize.close());

interface JobRow {
  data: unknown;
  retryLimit: number;
  seconds: number;
  deadLetter: string;
  priority: number;
}

function jobsFor(mapId: string): Promise<JobRow[]> {
  return sequelize.query<JobRow>(
    `SELECT data, retry_limit AS "retryLimit", extract(epoch FROM expire_in)::int AS seconds, dead_letter AS "deadLetter",
       priority FROM ${QUEUE_SCHEMA}.job WHERE data ->> 'mapId' = $1 ORDER BY data ->> 'index'`,
    { bind: [mapId], type: QueryTypes.SELECT },
  );
}

describe('a job', () => {
  it('is there once the transaction of its row is', async () => {
    const data = { mapId: randomUUID(), attempt: 1, index: 0 };
    await sequelize.transaction(async (transaction) => {
      await enqueue(mapTileJob, data, { transaction });
      expect(await jobsFor(data.mapId)).toEqual([]);
    });
    const { expireInSeconds, retryLimit } = mapTileJob.options;
    expect(await jobsFor(data.mapId)).toEqual([
      { data, retryLimit, seconds: expireInSeconds, deadLetter: deadLetterOf(mapTileJob), priority: 0 },
    ]);
  });

  it('is not there where the transaction fails', async () => {
    const mapId = randomUUID();
    const failing = sequelize.transaction(async (transaction) => {
      await enqueue(mapTileJob, { mapId, attempt: 1, index: 0 }, { transaction });
      await enqueueAll(mapTileJob, [{ mapId, attempt: 1, index: 1 }], { transaction });
      throw new Error('on second thoughts');
    });
    await expect(failing).rejects.toThrow('on second thoughts');
    expect(await jobsFor(mapId)).toEqual([]);
  });

  it('can be one of many, with a time and a priority of their own', async () => {
    const mapId = randomUUID();
    const list = [0, 1, 2].map((index) => ({ mapId, attempt: 3, index }));
    await sequelize.transaction((transaction) =>
      enqueueAll(mapTileJob, list, { transaction, priority: -2, expireInSeconds: 77 }),
    );
    const jobs = await jobsFor(mapId);
    expect(jobs.map(({ data }) => data)).toEqual(list);
    expect(jobs.every(({ seconds, priority }) => seconds === 77 && priority === -2)).toBe(true);
  });

  it('must fit its definition', async () => {
    const data = { mapId: 'no id', attempt: 1, index: 0 };
    await expect(
      sequelize.transaction((transaction) => enqueue(mapTileJob, data, { transaction })),
    ).rejects.toMatchObject({ name: 'ZodError' });
  });

  it('is refused aloud where its queue is missing', async () => {
    const missing = { ...mailJob, name: 'never-made' };
    const mail = { id: randomUUID(), to: 'someone@example.com', template: 'remark', data: {} };
    await expect(sequelize.transaction((transaction) => enqueue(missing, mail, { transaction }))).rejects.toThrow(
      'The queue "never-made" does not exist.',
    );
    await expect(sequelize.transaction((transaction) => enqueueAll(missing, [mail], { transaction }))).rejects.toThrow(
      'The queue "never-made" does not exist.',
    );
  });
});

describe('the queues', () => {
  it('can be prepared again and again, and take on changed numbers', async () => {
    const numbers = () =>
      sequelize.query<{ name: string; retryLimit: number }>(
        `SELECT name, retry_limit AS "retryLimit" FROM ${QUEUE_SCHEMA}.queue ORDER BY name`,
        { type: QueryTypes.SELECT },
      );
    const before = await numbers();
    await sequelize.query(`UPDATE ${QUEUE_SCHEMA}.queue SET retry_limit = 1 WHERE name = $1`, { bind: [mailJob.name] });
    await prepareQueues();
    expect(await numbers()).toEqual(before);
    const names = before.map(({ name }) => name);
    for (const job of JOBS) {
      expect(names).toEqual(expect.arrayContaining([job.name, deadLetterOf(job)]));
      expect(job.options.retryLimit).toBeGreaterThanOrEqual(10);
    }
  });
});
