export { WaitingScreen as default } from '@/features/queue/WaitingScreen';
