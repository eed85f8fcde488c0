import { onEveryDatabase } from '../contracts/databases.ts';
import { subscriptionsContract } from '../contracts/subscriptions.contract.ts';

onEveryDatabase('the records', (open) => subscriptionsContract('on record', open));
