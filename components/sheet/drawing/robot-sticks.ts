export * from '@/lib/layout/robot-sticks';
