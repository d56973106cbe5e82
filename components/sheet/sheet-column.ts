export interface SheetColumn {
  /** Short name, such as "energy". */
  name: string;
  /** Unit behind the name, or an empty string. */
  unit: string;
  numeric: boolean;
}
