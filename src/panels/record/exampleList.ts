import index from '../../../public/examples/index.json';

/** The examples as their own index lists them. */
export const examples: readonly { readonly file: string; readonly title: string; readonly description: string }[] =
  index;
