import { conversationsContract } from '../contracts/conversations.contract.ts';
import { onEveryDatabase } from '../contracts/databases.ts';

onEveryDatabase('the askings of a thread and of a person', conversationsContract);
