import { config } from 'zod';

// The content security policy forbids making code from strings, which zod would try (and report) for speed.
config({ jitless: true });
