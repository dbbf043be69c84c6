/** The weights of all lines in all drawings, as on a machinist's drawing: thin for scales, thick for what matters. */
export const lineWeight = { hair: 1, mark: 1.5, strong: 2.5 } as const;
