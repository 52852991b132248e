import { buildClient } from '@/server/launch/build-client';

buildClient((line) => console.log(line)).then(
  () => console.log('The web client in dist/ is current'),
  (error: unknown) => {
    console.error(error instanceof Error ? error.message : error);
    process.exitCode = 1;
  },
);
