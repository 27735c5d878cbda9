export { SignInPage as Component } from '#client/features/session/sign-in-page.tsx'
