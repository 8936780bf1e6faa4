import { randomToken } from '../tokens';

/** In front of every token, so that one that got into a file or a log by mistake can be found. */
const PREFIX = 'elbow_';

export const newTokenText = (): string => `${PREFIX}${randomToken()}`;

/** What its owner knows it by again. */
export const hintOf = (token: string): string => `${token.slice(0, PREFIX.length + 4)}…`;

export const looksLikeToken = (text: string): boolean => text.startsWith(PREFIX) && text.length === PREFIX.length + 43;
