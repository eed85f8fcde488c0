/**
 * What a message and a view must keep to on the messaging platform, in characters (UTF-16 code units) and counts, as its
 * published pages on blocks, views and messages say. What the platform only advises is kept like the rest.
 */
export const platformLimits = {
  message: {
    blocks: 50,
    textHard: 40000,
    textAdvised: 4000,
    updateTextAdvised: 4000,
    blocksTotalCharactersAdvised: 13000,
    tablesPerMessage: 1,
    textFallbackRequired: true,
  },
  view: {
    blocks: 100,
    title: 24,
    submitLabel: 24,
    closeLabel: 24,
    privateMetadata: 3000,
    callbackId: 255,
    bytes: 250000,
    stack: 3,
  },
  ids: { blockId: 255, actionId: 255, blockIdUniqueInMessage: true },
  section: { text: 3000, fields: 10, fieldText: 2000 },
  header: { text: 150, plainTextOnly: true },
  context: { elements: 10 },
  actions: { elements: 25 },
  button: { text: 75, value: 2000, url: 3000, accessibilityLabel: 75 },
  select: { options: 100, optionGroups: 100, optionText: 75, optionValue: 150, placeholder: 150 },
  checkboxes: { options: 10 },
  overflow: { options: 5 },
  confirm: { title: 100, text: 300, button: 30 },
  image: { altText: 2000, altTextRequired: true, title: 2000, url: 3000 },
  input: { label: 2000, hint: 2000, maxLength: 3000 },
  table: {
    rows: 100,
    columns: 20,
    charactersAllCells: 10000,
    perMessage: 1,
    cellMinimumCharacters: 1,
    cellTypes: ['raw_text', 'rich_text'],
    equalCellsPerRow: true,
    messagesOnly: true,
  },
  markdown: { textAllBlocks: 12000 },
} as const;
