/** Address and parcel on one line, as a title block says them; the parcel's number is kept together. */
export function PlaceLine({ addressLines, parcel, empty = "" }: { addressLines: string; parcel: string; empty?: string }) {
  const address = addressLines.split("\n").map((part) => part.trim()).filter(Boolean).join(", ");
  if (!address && !parcel) return <>{empty}</>;
  return (
    <>
      {address}
      {address && parcel && ". "}
      {parcel && <span className="whitespace-nowrap">Parcel {parcel}</span>}
    </>
  );
}
