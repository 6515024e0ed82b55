import type { ReadingContext, ScreenRows } from '../reading';
import type { Table } from '../table';

/** One way to arrange a screen in a file. */
export interface Layout {
  /** Kebab-case name, such as `wells-and-readings`. */
  name: string;
  /** The tables this layout would read, in its own order; null when it does not fit. */
  recognise(tables: readonly Table[]): RecognisedTables | null;
  /** Reads wells and readings, reporting every fault; null when nothing can be made of it. */
  read(tables: readonly Table[], context: ReadingContext): ScreenRows | null;
}

export interface RecognisedTables {
  /** One table for each part of the layout. */
  tables: Table[];
  /** Further tables that would fit one of the parts as well. */
  rivals: Table[];
}
