import nextEnv from '@next/env';

// Imported before anything that reads the environment: the same .env files as the web processes, by the same rules.
const silent = { info: () => undefined, error: console.error };
nextEnv.loadEnvConfig(process.cwd(), process.env.NODE_ENV !== 'production', silent);
