/** Writes config/example-settings.yaml from the schema. Build first: it runs the built program. */
import { writeFileSync } from 'node:fs';
import { exampleSettings } from '../../dist/config/example.js';

writeFileSync(new URL('../../config/example-settings.yaml', import.meta.url), exampleSettings());
