export { NamedView as TensileView } from '../named/named-view.tsx'
