import { expect, test } from 'vitest';
import {
  firstExamples,
  generalTopic,
  helpTopics,
  notAsked,
  topicNamed,
  verbTopics,
} from '../../src/questions/help/topics.ts';
import { context, questionIn, questionsIn } from './asking.ts';

const examples = [...helpTopics, generalTopic(context.builtVerbs)].flatMap((topic) =>
  topic.examples.map((example): [string, string] => [example, topic.name]),
);

test.each(examples)('the example %s of help %s is read', (example) => {
  expect(questionsIn(example).length).toBeGreaterThan(0);
});

test.each(verbTopics.map(({ name, examples: own }) => [name, own] as const))(
  'the examples of help %s ask that verb',
  (name, own) => {
    expect(own.map((example) => questionsIn(example)[0]?.question.verb)).toEqual(own.map(() => name));
  },
);

test.each(helpTopics.flatMap(({ name, words }) => [name, ...words].map((word) => [word, name] as const)))(
  'help %s is about %s',
  (word, name) => {
    expect(questionIn(`help ${word}`).question).toEqual({ verb: 'help', topic: name });
    expect(topicNamed(word)?.name).toBe(name);
  },
);

test('no two topics share a word', () => {
  const words = helpTopics.flatMap((topic) => [topic.name, ...topic.words]);
  expect(new Set(words).size).toBe(words.length);
});

test('every verb that can be asked has a topic, and help lists it', () => {
  expect(verbTopics.map(({ name }) => name).sort()).toEqual([...context.builtVerbs].sort());
  expect(generalTopic(context.builtVerbs).forms).toHaveLength(context.builtVerbs.length);
  expect(generalTopic(['help']).forms).toEqual(['help: what can be asked']);
});

test.each(['correlation', 'prices', 'direction'])(
  '%s cannot be asked, and help says what comes nearest',
  (name) => {
    expect(notAsked(name)?.nearest).toMatch(/nearest/);
    expect(generalTopic(context.builtVerbs).remarks.join(' ')).toContain(
      notAsked(name)?.nearest ?? 'nothing',
    );
  },
);

test('three examples greet someone who asks nothing', () => {
  expect(firstExamples).toHaveLength(3);
});
