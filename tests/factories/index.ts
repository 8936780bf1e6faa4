/** Each factory makes its own parents unless it is given them. */
export * from './counter';
export * from './library-fixtures';
export * from './mailbox';
export * from './people';
export * from './request';
export * from './sharing';
export * from './work';
