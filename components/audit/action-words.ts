/** `share_link.created` as `Share link created`. */
export function actionWords(action: string): string {
  const words = action.replace(/[._]/g, ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** Facts of an event in one line: `name: Bay 4, role: planner`. */
export function detailWords(details: Record<string, unknown>): string {
  return Object.entries(details)
    .filter(([key]) => key !== 'apiTokenId')
    .map(([key, value]) => `${spaced(key)}: ${typeof value === 'object' ? JSON.stringify(value) : String(value)}`)
    .join(', ');
}

const spaced = (key: string): string => key.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();
