/** The two ways to run a batch, as the keys of their quantities begin: the base step alone, or the acid step first. */
export type RouteName = 'direct' | 'twoStep';
