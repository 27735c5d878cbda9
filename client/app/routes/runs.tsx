/** /runs */
export { RunListPage as Component } from '#client/features/runs/run-list-page.tsx'
