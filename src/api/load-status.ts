/** How something that is asked for stands. */
export type LoadStatus = 'idle' | 'loading' | 'ready' | 'error';
