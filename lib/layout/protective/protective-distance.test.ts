import { describe, expect, it } from 'vitest';
import { protectiveDeviceSchema } from '../items';
import { protectiveDistance } from './protective-distance';

const device = (inputs: object) =>
  protectiveDeviceSchema.parse({
    kind: 'protectiveDevice',
    id: '00000000-0000-4000-8000-0000000000d1',
    name: 'Curtain',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    pointsMm: [[0, 0], [1000, 0]], // prettier-ignore
    responseS: 0,
    ...inputs,
  });

const distance = (inputs: object): number => {
  const answer = protectiveDistance(device(inputs));
  if (!answer.told) throw new Error(answer.questions.map(({ field }) => field).join());
  return answer.distanceMm;
};

describe('the distance of a light curtain at right angles, ISO 13855:2010', () => {
  // T (s), d (mm) → S (mm); worked out by hand from the form as secondary sources give it.
  it.each([
    [0.1, 14, 200],
    [0.15, 30, 428],
    [0.25, 30, 528],
    [0.26, 14, 500],
  ])('T %f s, d %i mm gives %i mm', (stopS, detectionMm, expected) => {
    expect(distance({ stopS, detectionMm })).toBeCloseTo(expected, 9);
  });

  it('adds the times of machine and device', () => {
    expect(distance({ stopS: 0.1, responseS: 0.05, detectionMm: 30 })).toBeCloseTo(428, 9);
  });

  it('is never below 100 mm, and never falls as the time grows within a form', () => {
    expect(distance({ stopS: 0.01, detectionMm: 14 })).toBe(100);
    let before = 0;
    for (let stopS = 0; stopS <= 1; stopS += 0.01) {
      const next = distance({ stopS, detectionMm: 14 });
      expect(next).toBeGreaterThanOrEqual(before);
      before = next;
    }
  });

  it('takes reaching over where it asks for more', () => {
    expect(distance({ stopS: 0.1, detectionMm: 14, reachOverMm: 150 })).toBeCloseTo(350, 9);
    expect(distance({ stopS: 0.15, detectionMm: 30, reachOverMm: 50 })).toBeCloseTo(428, 9);
  });
});

describe('the distance of a parallel field', () => {
  it.each([
    [0, 1680],
    [500, 1480],
    [1000, 1330],
  ])('T 0.3 s, H %i mm gives %i mm by the 2010 edition', (fieldHeightMm, expected) => {
    expect(distance({ form: 'field', stopS: 0.3, fieldHeightMm })).toBeCloseTo(expected, 9);
  });

  it('drops the height term and takes a supplement by the 2024 edition', () => {
    const inputs = { form: 'field', edition: '2024', stopS: 0.3, fieldHeightMm: 1000 };
    expect(distance({ ...inputs, supplementMm: 0 })).toBeCloseTo(1680, 9);
    expect(distance({ ...inputs, supplementMm: 120 })).toBeCloseTo(1800, 9);
  });
});

describe('a figure that is missing', () => {
  const asked = (inputs: object): string[] => {
    const answer = protectiveDistance(device(inputs));
    return answer.told ? [] : answer.questions.map(({ field }) => field);
  };

  it('is asked for, never guessed', () => {
    expect(asked({ responseS: null })).toEqual(['stopS', 'responseS', 'detectionMm']);
    expect(asked({ form: 'field', stopS: 0.3 })).toEqual(['fieldHeightMm']);
    expect(asked({ form: 'field', edition: '2024', stopS: 0.3 })).toEqual(['supplementMm']);
  });

  it('is asked for where the form is not encoded', () => {
    expect(asked({ stopS: 0.1, detectionMm: 55 })).toEqual(['ownAddedMm']);
    expect(asked({ edition: '2024', stopS: 0.1, detectionMm: 30, supplementMm: 0 })).toEqual(['ownAddedMm']);
    expect(distance({ stopS: 0.1, detectionMm: 55, ownAddedMm: 850 })).toBeCloseTo(1010, 9);
  });
});

it('says what it leaves open and where it comes from, and never that anything is safe', () => {
  const answer = protectiveDistance(device({ stopS: 0.1, detectionMm: 14 }));
  expect(answer.source).toMatch(/ISO 13855:2010.*secondary sources and memory/);
  expect(answer.told && answer.open.join(' ')).toMatch(/Reaching over/);
  expect(JSON.stringify(answer)).not.toMatch(/\bsafe\b|compliant/i);
});
