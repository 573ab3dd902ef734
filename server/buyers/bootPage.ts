import { type AvailableFish, type AvailablePage, showAvailablePhoto } from '../../shared/buyers/available';
import {
  classesLine,
  comingWords,
  coverWords,
  eachWords,
  factsLine,
  howToAsk,
  inbreedingLine,
  lotsLine,
  pageDescription,
  pageTitle,
  parentsLine,
} from '../../shared/buyers/publicWords';
import { BOOT_STYLE } from './bootStyle';

const SIGNS: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escaped = (text: string): string => text.replace(/[&<>"']/g, (sign) => SIGNS[sign] ?? sign);
const paragraph = (text: string | null, look = ''): string =>
  text ? `<p${look ? ` class="${look}"` : ''}>${escaped(text).replace(/\n/g, '<br>')}</p>` : '';

/**
 * The app's page with this fishroom's fish written into it: its head for link previews, its boot element for readers. On a slow
 * line the picture and the one font it is read in go before the app, which only comes to take the page over.
 */
export function bootPage(template: string, page: AvailablePage, origin: string): string {
  const written = template
    .replace(/<meta name="description"[^>]*>/, '')
    .replace(/<title>[^<]*<\/title>/, () => headOf(page, origin))
    .replace(/<svg class="boot-mark"[\s\S]*?<\/svg>/, () => bodyOf(page))
    .replace(/<noscript><main>[\s\S]*?<\/main><\/noscript>/, '')
    .replace(/<link rel="preload"[^>]*(?:mono|condensed)[^>]*>/g, '');
  return lateApp(written);
}

const APP_SCRIPT = /<script src="([^"]+)" defer><\/script>/g;

/** The app's scripts, named to one that fetches them when what is to be read is there. */
function lateApp(page: string): string {
  const sources = [...page.matchAll(APP_SCRIPT)].map(([, source = '']) => source);
  if (sources.length === 0) return page;
  const late = `<script src="/late.js" defer data-sources="${sources.join(' ')}"></script>`;
  return page.replace(APP_SCRIPT, '').replace('</body>', () => `${late}</body>`);
}

function headOf(page: AvailablePage, origin: string): string {
  const title = escaped(pageTitle(page));
  const description = escaped(pageDescription(page));
  const address = escaped(`${origin}/available/${page.slug}`);
  const picture = photoAddress(page);
  const icon = escaped(`${origin}${picture ?? '/icons/icon-512.png'}`);
  return [
    `<title>${title}</title>`,
    `<meta name="description" content="${description}">`,
    `<link rel="canonical" href="${address}">`,
    '<meta property="og:type" content="website">',
    `<meta property="og:title" content="${title}">`,
    `<meta property="og:description" content="${description}">`,
    `<meta property="og:url" content="${address}">`,
    `<meta property="og:image" content="${icon}">`,
    '<meta name="twitter:card" content="summary_large_image">',
    picture ? `<link rel="preload" as="image" href="${picture}" fetchpriority="high">` : '',
    `<style>${BOOT_STYLE}</style>`,
  ].join('\n    ');
}

const WITHOUT_SCRIPT = 'The form needs JavaScript: allow it for this page, or reach the fishroom by other means.';

const photoAddress = ({ slug, photo }: AvailablePage): string | null =>
  photo && showAvailablePhoto.path.replace(':slug', slug).replace(':photoId', photo.id).replace(':size', 'large');

function bodyOf(page: AvailablePage): string {
  const now = page.fish.filter(({ coming }) => coming === null);
  const coming = page.fish.filter((fish) => fish.coming !== null);
  return [
    '<main class="pub"><div class="side">',
    `<header><h1>${escaped(page.name)}</h1>${paragraph(page.words)}</header>`,
    coverOf(page),
    '</div><div class="list">',
    '<section><h2>Available now<small>price each</small></h2>',
    now.length === 0 ? '<p>No fish are available at the moment.</p>' : '',
    ...now.map((fish) => fishOf(fish, page.currency)),
    '</section>',
    coming.length > 0 ? `<section><h2>Coming</h2>${coming.map(comingOf).join('')}</section>` : '',
    `<section><h2>How to ask</h2>${paragraph(howToAsk(page))}<noscript>${paragraph(WITHOUT_SCRIPT)}</noscript>${paragraph(page.terms)}</section>`,
    '</div></main>',
    // Data, not script: the app starts from it instead of asking again.
    `<script type="application/json" id="available">${JSON.stringify(page).replace(/</g, '\\u003c')}</script>`,
  ].join('');
}

function coverOf(page: AvailablePage): string {
  const [address, words] = [photoAddress(page), coverWords(page)];
  if (!address || !words) return '';
  return `<figure><img src="${address}" alt="${escaped(words.caption)}" fetchpriority="high"><figcaption><span>${escaped(words.caption)}</span><span>${words.on}</span></figcaption></figure>`;
}

function fishOf(fish: AvailableFish, currency: string): string {
  return [
    `<article><div class="pair"><h3><i>${escaped(fish.name)}</i></h3><b class="price">${escaped(eachWords(fish, currency))}</b></div>`,
    `<div class="pair"><span>${escaped(factsLine(fish))}</span><span><b>${fish.available}</b> <small>available</small></span></div>`,
    paragraph(classesLine(fish, currency), 'small'),
    paragraph(lotsLine(fish, currency), 'small'),
    paragraph(fish.note, 'small'),
    paragraph(`Brood ${fish.code}: ${parentsLine(fish)}. ${inbreedingLine(fish)}`, 'small'),
    '</article>',
  ].join('');
}

const comingOf = (fish: AvailableFish): string =>
  `<article><h3><i>${escaped(fish.name)}</i></h3><div>${escaped(factsLine(fish))}</div>${paragraph(comingWords(fish), 'small')}</article>`;
