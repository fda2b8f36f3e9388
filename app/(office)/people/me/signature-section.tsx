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
          <img
            src={`/people/me/signature?${signatureKey.slice(-12)}`}
            alt="Your signature"
            className="max-h-32 justify-self-start border border-rule bg-white"
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
          className="min-h-[44px]"
        />
        <p>
          <Button type="submit">Use this picture</Button>
        </p>
      </form>
    </section>
  );
}
