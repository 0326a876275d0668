import { z } from 'zod';

/** zod tries `new Function` unless told not to; the content security policy forbids it and says so in the console. */
z.config({ jitless: true });
