import { checkHealth } from '@/db/health';
import { storage } from '@/lib/storage/storage';

/** For a load balancer: each part by name, 503 while one of them does not answer. */
export async function GET(): Promise<Response> {
  const [{ database, queue }, store] = await Promise.all([checkHealth(), checkStorage()]);
  const parts = { database, queue, storage: store };
  const isWell = Object.values(parts).every((part) => part === 'ok');
  return Response.json(parts, { status: isWell ? 200 : 503, headers: { 'cache-control': 'no-store' } });
}

async function checkStorage(): Promise<'ok' | 'down'> {
  try {
    await storage().stat('health');
    return 'ok';
  } catch {
    return 'down';
  }
}
