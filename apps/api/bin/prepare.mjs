// Installs what a fresh clone needs and nothing else; npm start and npm test do this by themselves.
import { install } from './bootstrap.mjs';

install();
