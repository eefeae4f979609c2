/** Texts that read as below a detection limit unless the person says otherwise, besides `<0.05` (from common practice of laboratories). */
export const defaultLimitWords: readonly string[] = ['bdl', 'bql', '<lod', '<loq', '<dl', '<ql', '<mdl', '<bg', '<ng'];
