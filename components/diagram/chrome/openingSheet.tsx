/** The desk while a drawing is read: bar, frame and parts as bars, no spinner. */
export function OpeningSheet() {
  return (
    <div className="flex h-dvh flex-col bg-desk" role="status" aria-label="Opening the drawing" aria-busy="true">
      <div className="flex h-bar items-center border-b-[1.5px] border-ink bg-panel px-4"><span className="text-body text-ink2">Opening</span></div>
      <div className="relative m-8 flex-1 border border-rule bg-paper">
        <div className="absolute inset-5 border-2 border-ink" />
        {[[12, 14, 16], [30, 20, 22], [18, 34, 12], [52, 18, 14], [48, 40, 26], [22, 52, 18], [62, 58, 12], [34, 68, 30]].map(([left, top, width]) => <span key={`${left}-${top}`} className="absolute h-1.5 bg-desk2" style={{ left: `${left}%`, top: `${top}%`, width: `${width}%` }} />)}
        <p className="absolute left-1/2 top-1/2 -translate-x-1/2 border border-ink bg-vellum px-4 py-2 text-text font-strong">Reading the drawing.</p>
      </div>
    </div>
  );
}
