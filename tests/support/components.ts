import { cleanup, configure } from '@testing-library/react';
import { afterEach } from 'vitest';

// A busy machine can need longer than the usual second to draw; a check that fails still fails.
configure({ asyncUtilTimeout: 10_000 });

afterEach(cleanup);
