import { layoutSchema, type Layout } from '@/lib/contracts/layouts';
import { Autosave } from '@/lib/editor/autosave';
import { joinKept, readKept, settleKept } from '@/lib/editor/kept-edits';
import { SettingsKeeper } from '@/lib/editor/settings-keeper';
import { Sheet } from '@/lib/editor/sheet';
import { watchChanges } from '@/lib/editor/watch-changes';
import { browserTimer } from './browser-timer';
import { fetcher, ProblemError, sayError, send } from './fetcher';
import { PresenceKeeper } from '@/lib/editor/presence';
import { keptStore } from './kept-store';
import { askChanges, isPassing, reportPresence, sendBatch } from './layout-transport';

/** A layout on the board: the document and the things that keep it and the server of one mind. */
export interface OpenLayout {
  readonly layout: Layout;
  readonly sheet: Sheet;
  readonly autosave: Autosave;
  readonly settings: SettingsKeeper;
  /** Other planners on this sheet. */
  readonly presence: PresenceKeeper;
  close(): void;
}

export interface OpenOptions {
  readonly layoutId: string;
  readonly userId: string;
  /** Somebody put another floor plan under the sheet. */
  readonly onFloorPlan: (floorPlanId: string | null) => void;
}

const newId = () => crypto.randomUUID();
const KEPT_BUT_OFFLINE =
  'The server cannot be reached. Edits that you made earlier are kept in this browser; try again in a moment.';

/**
 * Opens a layout for editing: settles what an earlier visit left unsent, loads the layout, lays the kept edits over it and
 * starts saving and watching. Throws ProblemError.
 */
export async function openLayout({ layoutId, userId, onFloorPlan }: OpenOptions): Promise<OpenLayout> {
  const store = keptStore(layoutId, userId);
  const settled = [];
  for (const text of await store.read()) {
    const kept = readKept(text);
    if (!kept) continue;
    const edits = await settleKept(kept, (batch) => sendBatch(layoutId, batch));
    if (!edits) throw offline();
    settled.push(edits);
  }
  const layout = await fetcher(`/api/layouts/${encodeURIComponent(layoutId)}`, layoutSchema);
  const sheet = new Sheet({ layoutVersion: layout.version, items: layout.items, edits: joinKept(settled) }, newId);
  const autosave = new Autosave(sheet, {
    send: (batch) => sendBatch(layoutId, batch),
    keep: (edits) => store.write(edits && JSON.stringify(edits)),
    timer: browserTimer,
    newId,
  });
  store.dropTakenOver();
  const settings = new SettingsKeeper(layout.mapSettings, {
    save: (mapSettings) => saveSettings(layoutId, mapSettings),
    timer: browserTimer,
  });
  let askNow = () => {};
  const unwatch = watchChanges(sheet, {
    onReady: (ask) => (askNow = ask),
    ask: (since) => askChanges(layoutId, since),
    timer: browserTimer,
    isAwake: () => document.visibilityState === 'visible',
    onChanges: (changes) => {
      settings.merge(changes.mapSettings);
      onFloorPlan(changes.floorPlanId);
    },
  });
  const presence = new PresenceKeeper({
    report: (report) => reportPresence(layoutId, report),
    timer: browserTimer,
    isAwake: () => document.visibilityState === 'visible',
    seat: newId(),
    chosenIds: () => sheet.getState().selection.itemIds,
    onVersion: (layoutVersion) => {
      const { sync } = sheet.getState();
      if (layoutVersion > sync.layoutVersion && !sync.inFlight) askNow();
    },
  });
  const wake = () => autosave.wake();
  window.addEventListener('online', wake);
  document.addEventListener('visibilitychange', wake);
  const close = () => {
    unwatch();
    presence.stop();
    autosave.stop();
    settings.stop();
    window.removeEventListener('online', wake);
    document.removeEventListener('visibilitychange', wake);
  };
  return { layout, sheet, autosave, settings, presence, close };
}

async function saveSettings(layoutId: string, mapSettings: Layout['mapSettings']) {
  try {
    await send('PATCH', `/api/layouts/${encodeURIComponent(layoutId)}`, { mapSettings });
    return null;
  } catch (error) {
    return { passing: isPassing(error), message: sayError(error) };
  }
}

function offline(): ProblemError {
  return new ProblemError({
    type: 'about:blank',
    title: 'No answer',
    status: 0,
    code: 'unreachable',
    detail: KEPT_BUT_OFFLINE,
    requestId: '',
  });
}
