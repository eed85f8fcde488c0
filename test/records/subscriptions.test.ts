import { onEveryDatabase } from '../contracts/databases.ts';
import { subscriptionsContract } from '../contracts/subscriptions.contract.ts';
import { subscriptionsInMemory } from '../doubles/subscriptions.ts';

onEveryDatabase('the records', (open) => subscriptionsContract('on record', open));

subscriptionsContract('of the double', async () => ({ subscriptions: subscriptionsInMemory() }));
