import { bottomAreas } from "./areas";
import { cautionPrimitives, stripPrimitives } from "./bottom";
import type { SheetContext, SheetPage, SheetWords } from "./context";
import { busTable, interlocksTable, statesTable } from "./derived";
import { framePrimitives } from "./frame";
import { oneLine } from "./oneline";
import { layered, sheetPx, type Primitive } from "./primitives";
import { sheetGeometry } from "./size";
import { tablePrimitives, type Table } from "./table";
import { titleBlockPrimitives } from "./titleBlock";

/** Tables derived from the drawing, where the drawing gives them a place. */
function derivedTables(context: SheetContext): Primitive[] {
  const { graph, drawing, states } = context;
  const made: Partial<Record<keyof typeof drawing.sheet.tables, Table | null>> = { states: statesTable(graph, states), interlocks: interlocksTable(graph), "bus-checks": busTable(context) };
  return (Object.keys(made) as (keyof typeof made)[]).flatMap((name) => {
    const place = drawing.sheet.tables[name];
    const table = made[name];
    return place && table ? tablePrimitives(sheetPx(place.x), sheetPx(place.y), table) : [];
  });
}

/** The one-line diagram with its frame, cautions, legend, keynotes and the place for stamps. */
export function oneLineSheet(context: SheetContext, words: SheetWords, numbers: { schedule: string; accepted: string }): SheetPage {
  const g = sheetGeometry(context.drawing.sheet.size);
  const { cautions, strip } = bottomAreas(g);
  const primitives = [
    ...framePrimitives(g),
    ...oneLine(context.graph),
    ...derivedTables(context),
    ...cautionPrimitives(cautions, context.graph),
    ...stripPrimitives(strip, context.graph, numbers.schedule, g.pxPerIn),
    ...titleBlockPrimitives(g, context, words, { acceptedOn: numbers.accepted }),
  ];
  return { number: words.number, title: words.title, widthIn: g.widthIn, heightIn: g.heightIn, widthPx: g.widthPx, heightPx: g.heightPx, primitives: layered(primitives) };
}
