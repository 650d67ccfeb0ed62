export { FirmGate as default } from '../../features/shell/firm-gate.tsx';
