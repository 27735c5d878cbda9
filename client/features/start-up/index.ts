export { StartUpPage, type StartUpPageProps } from '#client/features/start-up/components/start-up-page.tsx'
