/** Version of the estimation core, carried in every fit so that a number can be traced to the code that made it. */
export const coreVersion = '0.1.0';
