import { fireEvent, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { NO_ROBOT, type FloorMap } from '@/lib/layout/floor-map';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { show } from '@/tests/components/show';
import { MapKey, type MapKeyProps } from './map-key';

/** Ten cells of a square metre: six at 0.3, two at 0.05, two not reached. */
const map: FloorMap = {
  grid: { originMm: [0, 0], stepMm: 1000, columns: 10, rows: 1 },
  measure: 'inverseConditionNumber',
  value: Float32Array.of(0.3, 0.3, 0.3, 0.3, 0.3, 0.3, 0.05, 0.05, NaN, NaN),
  robot: Uint8Array.of(0, 0, 0, 0, 0, 0, 0, 0, NO_ROBOT, NO_ROBOT),
  branch: new Uint8Array(10),
  reachedBy: Uint8Array.of(2, 1, 1, 1, 1, 1, 1, 1, 0, 0),
};

function key(part: Partial<MapKeyProps> = {}) {
  const props: MapKeyProps = {
    settings: mapSettingsSchema.parse({}),
    scale: 'tide',
    range: { from: 0, to: 0.4 },
    map,
    work: { kind: 'none' },
    onMeasureChange: vi.fn(),
    onWristChange: vi.fn(),
    onScaleChange: vi.fn(),
    onThresholdChange: vi.fn(),
    onAsk: vi.fn(),
    onCancel: vi.fn(),
    onRetry: vi.fn(),
    ...part,
  };
  return { props, ...show(<MapKey {...props} />) };
}

describe('the key of the map', () => {
  it('says the question and the square metres in words', () => {
    key();
    expect(screen.getByText('tool down, height 850 mm, best robot')).toBeVisible();
    expect(screen.getByText(/of reached floor at or above the line/)).toHaveTextContent(
      '6.0 of 8.0 m²of reached floor at or above the line. Drag the line to set your own.',
    );
  });

  it('has a line that keys move: arrows by a hundredth of the scale, pages by a tenth, home and end to the ends', () => {
    const { props } = key();
    const line = screen.getByRole('slider', { name: 'Threshold, inverse condition number' });
    expect(line).toHaveAttribute('aria-valuetext', '0.10, 6.0 of 8.0 square metres at or above');
    const expected: [string, number][] = [
      ['ArrowRight', 0.104],
      ['ArrowDown', 0.096],
      ['PageUp', 0.14],
      ['Home', 0],
      ['End', 0.4],
    ];
    for (const [name, value] of expected) {
      fireEvent.keyDown(line, { key: name });
      expect(props.onThresholdChange).toHaveBeenLastCalledWith(value, true);
    }
  });

  it('is dragged by the pointer and settles when it is let go', () => {
    const { props } = key();
    const line = screen.getByRole('slider');
    // Before it is measured the histogram is 320 px wide.
    fireEvent.pointerDown(line, { button: 0, pointerId: 1, clientX: 80 });
    expect(props.onThresholdChange).toHaveBeenLastCalledWith(0.1, false);
    fireEvent.pointerMove(line, { pointerId: 1, clientX: 160 });
    expect(props.onThresholdChange).toHaveBeenLastCalledWith(0.2, false);
    fireEvent.pointerUp(line, { pointerId: 1, clientX: 900 });
    expect(props.onThresholdChange).toHaveBeenLastCalledWith(0.4, true);
    fireEvent.pointerMove(line, { pointerId: 1, clientX: 10 });
    expect(props.onThresholdChange).toHaveBeenCalledTimes(3);
  });

  it('offers a line where none is set', async () => {
    const settings = mapSettingsSchema.parse({ thresholds: { inverseConditionNumber: null } });
    const { props, user } = key({ settings });
    expect(screen.getByText(/of floor reached/)).toHaveTextContent('8.0 m²of floor reached.');
    await user.click(screen.getByRole('button', { name: /Set a line/ }));
    expect(props.onThresholdChange).toHaveBeenCalledWith(0.1, true);
  });

  it('changes wrist, measure and colours', async () => {
    const { props, user } = key();
    await user.click(screen.getByRole('radio', { name: 'Wrist free' }));
    expect(props.onWristChange).toHaveBeenCalledWith('free');
    await user.click(screen.getByRole('button', { name: /Inverse condition number/ }));
    await user.click(await screen.findByRole('menuitemradio', { name: 'Sure speed' }));
    expect(props.onMeasureChange).toHaveBeenCalledWith('sureSpeed');
    await user.click(screen.getByRole('button', { name: /Inverse condition number/ }));
    await user.click(await screen.findByRole('menuitemradio', { name: /Plum/ }));
    expect(props.onScaleChange).toHaveBeenCalledWith('plum');
  });

  it('tells reach by how many robots come, without a line', () => {
    key({ settings: mapSettingsSchema.parse({ measure: 'reach' }), map: { ...map, measure: 'reach' } });
    expect(screen.queryByRole('slider')).not.toBeInTheDocument();
    expect(screen.getByText(/of floor reached/)).toHaveTextContent(
      '8.0 m²of floor reached, 1.0 m² of it by two robots or more.',
    );
  });
});

describe('while there is no map', () => {
  it.each([
    [{ kind: 'noRobots' }, 'Place a robot on the floor, and its map is drawn here.'],
    [{ kind: 'queued' }, 'The map is waiting for its turn.'],
    [{ kind: 'cancelled' }, 'The map was cancelled.'],
    [{ kind: 'failed', reason: 'The arm is not in the library any more.' }, 'The arm is not in the library any more.'],
  ] as const)('says what keeps it away: %o', (work, words) => {
    key({ map: null, work });
    expect(screen.getByText(words)).toBeVisible();
  });

  it('asks, cancels and tries again', async () => {
    const asked = key({ map: null, work: { kind: 'notAsked' } });
    await asked.user.click(screen.getByRole('button', { name: 'Ask for the map' }));
    expect(asked.props.onAsk).toHaveBeenCalled();
    asked.unmount();
    const running = key({ map: null, work: { kind: 'running', done: 3, total: 12 } });
    expect(screen.getByRole('progressbar')).toHaveAttribute('aria-valuenow', '25');
    await running.user.click(screen.getByRole('button', { name: 'Cancel' }));
    expect(running.props.onCancel).toHaveBeenCalled();
    running.unmount();
    const failed = key({ map: null, work: { kind: 'failed', reason: 'No.' } });
    expect(screen.getByRole('alert')).toHaveTextContent('No.');
    await failed.user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(failed.props.onRetry).toHaveBeenCalled();
  });

  it('keeps the last map in sight while a newer one is computed', () => {
    key({ work: { kind: 'running', done: 1, total: 2 } });
    expect(screen.getByRole('slider')).toBeVisible();
    expect(screen.getByRole('progressbar')).toBeVisible();
  });

  it('does not show the figures of another measure', () => {
    key({ settings: mapSettingsSchema.parse({ measure: 'sureSpeed' }), work: { kind: 'queued' } });
    expect(screen.queryByRole('slider')).not.toBeInTheDocument();
    expect(screen.getByText('The map is waiting for its turn.')).toBeVisible();
  });
});
