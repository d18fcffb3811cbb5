import * as z from 'zod';
import { plainFault } from './app/form/plain-fault';

// The content security policy forbids `new Function`, which zod would try. Loaded as a polyfill, since a chunk that
// makes schemas may run before main.ts does.
z.config({ jitless: true, localeError: plainFault });
