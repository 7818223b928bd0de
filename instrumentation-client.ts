import { config } from 'zod/v4/core';

// zod tries `new Function` to see whether it may compile its parsers; under the content security policy the mere try
// is a reported violation.
config({ jitless: true });
