import Image from 'next/image';
import { Button } from '@/components/ui/button';
import { removeSignatureAction } from './actions';
import { SignaturePad } from './signature-pad';

/** The picture that reports print above the typed name: drawn here, or uploaded. */
export function SignatureSection({ signatureKey }: { signatureKey: string | null }) {
  return (
    <section id="signature" aria-labelledby="signature-title" className="grid gap-4 border-t-2 border-ink pt-4">
      <h2 id="signature-title" className="font-serif font-bold text-l">
        Signature
      </h2>
      {signatureKey ? (
        <>
          <Image
            width={400}
            height={200}
            unoptimized
            src={`/people/me/signature?${signatureKey.slice(-12)}`}
            alt="Your signature"
            className="h-auto max-h-32 w-auto justify-self-start border border-rule bg-[#fff]"
          />
          <form action={removeSignatureAction}>
            <Button type="submit">Remove the picture</Button>
          </form>
        </>
      ) : (
        <p>Reports show your typed name until there is a picture.</p>
      )}
      <SignaturePad />
      <form action="/people/me/signature" method="post" encType="multipart/form-data" className="grid gap-2">
        <label htmlFor="signature-file" className="text-s font-bold">
          Or a picture of it, JPEG or PNG
        </label>
        <input
          id="signature-file"
          type="file"
          name="picture"
          accept="image/png,image/jpeg"
          required
          className="min-h-[44px] max-w-full file:mr-3 file:min-h-[44px] file:cursor-pointer file:rounded-[2px] file:border file:border-solid file:border-ink file:px-4 file:font-bold"
        />
        <p>
          <Button type="submit">Use this picture</Button>
        </p>
      </form>
    </section>
  );
}
