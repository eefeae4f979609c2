/** Shown and printed wherever limits, floors, forecasts or code are. */
export const cautions = [
  'Statistical limits are not safety limits.',
  'Alarm, trip and interlock settings follow the site’s own procedures and applicable standards and are set by qualified people.',
  'A model describes the data it was fitted to and must be rechecked when the process changes.',
] as const;
