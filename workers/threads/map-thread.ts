export { computeTile, summarise } from '@/lib/server/maps/compute';
