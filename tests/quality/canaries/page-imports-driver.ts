// at: app/canary.tsx
// breaks: boundaries/dependencies
export { default } from 'postgres'
