import type { Series } from '../../../procedures/engine/showing';

/** How far the fetching of a series is. */
export type SeriesLoad =
  | { readonly status: 'loading' }
  | { readonly status: 'there'; readonly series: Series }
  /** The server does not have the bytes yet: the tablet still holds them. */
  | { readonly status: 'missing' }
  /** What came is not what the record names, or could not be fetched. */
  | { readonly status: 'failed'; readonly why: string };
