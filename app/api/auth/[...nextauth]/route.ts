export { answerAuth as GET, answerAuth as POST } from '@/lib/auth/handler';
