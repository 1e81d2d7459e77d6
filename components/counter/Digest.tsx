/** A digest in groups of four, so that two people can compare it aloud. */
export function Digest({ name, digest, note }: { name: string; digest: string | null; note: string }) {
  return (
    <div className="mt-4">
      <p className="text-body font-medium text-ink2">{name}</p>
      <p className="mt-1 grid grid-cols-[repeat(4,auto)] justify-start gap-x-3 font-lettering text-finding" data-digest={digest ?? ""}>
        {(digest?.toUpperCase().match(/.{4}/g) ?? ["not stored yet"]).map((part, index) => <span key={index}>{part}</span>)}
      </p>
      <p className="mt-1 text-label text-ink3">{note}</p>
    </div>
  );
}
