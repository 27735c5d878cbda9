/** The document's title; one per page, in the innermost route. */
export function PageTitle({ children }: { children: string }) {
  return <title>{`${children} · Sinewright`}</title>
}
