/** How a socket's mark is drawn: in full, as not used here, or as never tried. */
export type SymbolState = 'used' | 'unused' | 'untested'

/** A step's number: to do, to be done now, done. */
export type NumberState = 'todo' | 'now' | 'done'
