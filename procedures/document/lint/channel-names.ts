import type { Channel } from '../procedure-document';

/** The names that the channels of a series can have. */
export const channelNames: readonly Channel['name'][] = ['gauge', 'manifold', 'boost', 'sound'];
