/** Keeps the list's place while it is read. */
export default function Loading() {
  return (
    <div className="mx-auto max-w-6xl" role="status">
      <span className="sr-only">Reading the gear…</span>
      <div aria-hidden className="flex flex-col gap-3">
        <div className="h-9 w-32 bg-line-soft" />
        <div className="h-6 w-72 bg-line-soft" />
        <div className="mt-3 h-11 w-full bg-bench md:w-96" />
        {Array.from({ length: 8 }, (_, index) => <div key={index} className="h-12 w-full bg-bench" />)}
      </div>
    </div>
  );
}
