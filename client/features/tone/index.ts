export { TonePage, type TonePageProps } from '#client/features/tone/components/tone-page.tsx'
