/** Headers that every answer carries. The pages' content policy holds a nonce and is set in proxy.ts. */
const everywhere = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'X-Frame-Options', value: 'DENY' },
  { key: 'Referrer-Policy', value: 'same-origin' },
  { key: 'Permissions-Policy', value: 'camera=(), geolocation=(), microphone=(), payment=(), usb=()' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
  { key: 'Cross-Origin-Resource-Policy', value: 'same-origin' },
  { key: 'X-Robots-Tag', value: 'noindex, nofollow' },
]

/** What a route handler answers is data: were it opened as a page, it could load and run nothing. */
const data = [{ key: 'Content-Security-Policy', value: "default-src 'none'; frame-ancestors 'none'" }]

/** @type {import('next').NextConfig} */
const config = {
  reactStrictMode: true,
  poweredByHeader: false,
  devIndicators: false,
  allowedDevOrigins: ['127.0.0.1'],
  serverExternalPackages: [
    '@napi-rs/canvas',
    '@node-rs/argon2',
    'better-sqlite3',
    'file-type',
    'mailparser',
    'nodemailer',
    'pdfjs-dist',
    'pdfkit',
    'pino',
    'tsx',
  ],
  experimental: { optimizePackageImports: ['lucide-react', 'radix-ui'] },
  async headers() {
    return [
      { source: '/:path*', headers: everywhere },
      { source: '/api/:path*', headers: data },
    ]
  },
}

export default config
