import type { SheetVerdict } from './checkSheet';

/** A verdict for the reader: what was found, and what to do. */
export function verdictWords(verdict: SheetVerdict): { title: string; text: string } {
  switch (verdict.state) {
    case 'valid': {
      const { name, address } = verdict.content.fishroom;
      return {
        title: 'Valid',
        text: `Signed by ${name}, ${address.replace(/^https?:\/\//, '')}, and not changed since.`,
      };
    }
    case 'altered':
      return { title: 'Altered', text: 'This is not what the fishroom signed. Ask the seller for the sheet again.' };
    case 'badSignature':
      return { title: 'Not signed', text: BAD_SIGNATURE[verdict.because] };
    case 'unknownKey':
      return {
        title: 'Key not known',
        text: 'No key of that fishroom fits this sheet. Check the address, or paste the fishroom’s keys.',
      };
    case 'notASheet':
      return { title: 'Not a lineage sheet', text: NOT_A_SHEET[verdict.because] };
    case 'cannotCheck':
      return {
        title: 'Not checked',
        text: 'This browser can’t check signatures here. Use a newer one, or open the page by https.',
      };
  }
}

const BAD_SIGNATURE = {
  method: 'It is signed by a method that does not count, or not at all. Ask the seller for the sheet again.',
  length: 'Its signature is cut short or missing. Ask the seller for the sheet again.',
  otherKey: 'It is signed by another key than the one it names. Ask the seller for the sheet again.',
  otherAddress:
    'Its keys come from another address than the fishroom it names. Don’t trust it until you have asked that fishroom.',
} as const;

const NOT_A_SHEET = {
  form: 'Choose the file that came with the fish; its name ends in .kinwater.json.',
  content: 'It is signed, but it does not read as a lineage sheet.',
  newer: 'It was written by a newer version. Update this one, or check it on the issuer’s page.',
} as const;
