/** What the edge knows of the browser that asks: its secret cookie and where it calls from. */
export interface Visit {
  /** Random text in a cookie of that browser; a link it asks for works there only. */
  browser: string;
  address: string;
}
