import type { Time } from '../../src/workspaces/slack/ports.ts';

export declare const fastTime: (epochMs: number, speed: number) => Time;
