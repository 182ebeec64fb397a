import type { MetadataRoute } from 'next';

/** Answers about a piece lie at addresses that nobody should find by searching. */
export default function robots(): MetadataRoute.Robots {
  return { rules: { userAgent: '*', allow: '/', disallow: ['/check/', '/api/', '/broken'] } };
}
