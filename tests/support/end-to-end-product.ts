import { findFreePort } from '../../scripts/ports.ts';
import { startProduct } from './started-product.ts';
import { throwawayFolder } from './throwaway.ts';

/**
 * Starts the copy that all end-to-end specs share. The specs find its settings in their environment under the
 * names that the product itself uses: PUBLIC_URL, DATABASE_URL, OUTBOX_URL, AUTH_SECRET …
 * @returns ends it
 */
export default async function startForSpecs(): Promise<() => Promise<void>> {
  const folder = throwawayFolder('end-to-end');
  try {
    const port = await findFreePort();
    const product = await startProduct({
      PORT: String(port),
      DATA_DIR: folder.path,
      DEMO: '0',
      LOG_LEVEL: 'warn',
    });
    Object.assign(process.env, product.environment);
    return async () => {
      await product.stop();
      folder.remove();
    };
  } catch (error) {
    folder.remove();
    throw error;
  }
}
