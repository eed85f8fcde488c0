import { onEveryDatabase } from '../contracts/databases.ts';
import { pinsContract } from '../contracts/pins.contract.ts';

onEveryDatabase('pinned cards', pinsContract);
