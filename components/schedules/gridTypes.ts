import type { MarkKind } from "@/components/diagram/redlines/markKind";

export interface GridColumn<Row> {
  readonly id: string;
  readonly label: string;
  readonly unit: string;
  /** Heading over neighboring columns of the same group. */
  readonly group: string;
  readonly width: number;
  readonly right: boolean;
  readonly text: (row: Row) => string;
  readonly editable: (row: Row) => boolean;
  /** Words to choose from; others are still judged by the command. */
  readonly options?: readonly string[];
}
export interface GridChange<Row> { readonly row: Row; readonly column: GridColumn<Row>; readonly text: string }
export interface CellMark { readonly kind: MarkKind; readonly statement: string }

export interface GridProps<Row> {
  readonly label: string;
  readonly columns: readonly GridColumn<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  readonly selected: ReadonlySet<string>;
  readonly mark: (row: Row, column: GridColumn<Row>) => CellMark | null;
  readonly readOnly: boolean;
  readonly onSelect: (row: Row) => void;
  /** Applies all changes as one step or none; the answer is why not, or null. */
  readonly onChange: (changes: readonly GridChange<Row>[], title: string) => string | null;
}
