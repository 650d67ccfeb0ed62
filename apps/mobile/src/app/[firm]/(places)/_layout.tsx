export { PlacesLayout as default } from '../../../features/shell/places-layout.tsx';
