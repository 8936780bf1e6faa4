/** Puts the cursor into a cell of a draft, by its path in the arm's schema. */
export function focusCell(within: ParentNode | null, path: string): void {
  within?.querySelector<HTMLElement>(`[data-cell="${CSS.escape(path)}"]`)?.focus();
}
