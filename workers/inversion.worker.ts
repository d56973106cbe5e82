import { expose } from 'comlink';

import { createInversionService } from './service';

expose(createInversionService());
