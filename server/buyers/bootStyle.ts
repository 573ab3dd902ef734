/** The look of the page as it is sent: the app draws the same measures over it, so that nothing jumps when it takes over. */
export const BOOT_STYLE = `
#root:not(:has([role=heading])) + #boot { display: block; }
#boot main.pub { max-width: none; margin: 0; padding: 0; }
#boot .pub header { padding: 20px 16px 14px; }
#boot .pub h1 { font-size: 32px; line-height: 36px; letter-spacing: -.32px; margin: 0; }
#boot .pub header p { margin: 6px 0 0; }
#boot .pub figure { margin: 0 0 12px; }
#boot .pub img { display: block; width: 100%; height: 184px; object-fit: cover; }
#boot .pub figcaption { display: flex; justify-content: space-between; gap: 12px; padding: 8px 16px; font-size: 15px; line-height: 20px; color: var(--ink2); }
#boot .pub .list { padding: 0 16px 40px; }
#boot .pub section { margin-bottom: 20px; }
#boot .pub h2 { display: flex; justify-content: space-between; align-items: baseline; margin: 0; padding: 8px 0; font-weight: 700; border-bottom: 1px solid var(--rule); }
#boot .pub small { font-size: 15px; font-weight: 400; color: var(--ink2); }
#boot .pub article { padding: 12px 0; border-bottom: 1px solid var(--rule); }
#boot .pub .pair { display: flex; justify-content: space-between; align-items: baseline; gap: 12px; }
#boot .pub h3, #boot .pub .price { font-size: 19px; line-height: 24px; font-weight: 700; margin: 0; }
#boot .pub p { margin: 8px 0 0; color: var(--ink2); }
#boot .pub p.small { font-size: 15px; line-height: 20px; margin: 4px 0 0; }
@media (min-width: 720px) {
  #boot main.pub { display: grid; grid-template-columns: 500px 1fr; font-size: 15px; line-height: 21px; }
  #boot .pub header { padding: 40px 24px 24px 40px; }
  #boot .pub img { height: 380px; }
  #boot .pub figcaption { padding: 8px 24px 8px 40px; }
  #boot .pub .list { padding: 40px 48px 40px 40px; }
}
`;
