/** Low dark, high light, lightness rising evenly. 256 colours, six hex digits each, low first. */
const heightDigits = [
  '1f25551f26561f27571f28591f295a1f2a5b1f2b5c1f2c5d1f2c5e1f2d5f1e2e601e2f611e30621e31631e32641e3365',
  '1e34661e35671e36681e37691e386a1e396b1e396c1e3a6d1e3b6e1d3c6f1d3d701d3e711d3f721d40731d41741d4275',
  '1d43761d44761d45771c46781c47791c487a1c487b1c497c1b4a7d1b4b7d1b4c7e1b4d7f1b4e801b4f801b50811b5182',
  '1b52821b53831b54831b55841c55841c56851c57851c58851d59861d5a861e5b861e5c871f5d871f5d87205e88205f88',
  '21608821618822618822628923638923648924658925658925668926678a27688a27688a28698a296a8a296b8a2a6b8a',
  '2b6c8a2b6d8b2c6e8b2d6e8b2e6f8b2f708b2f708b30718b31728c32738c33738c34748c35758c36768c36768d37778d',
  '38788d39788d3a798d3b7a8d3c7a8d3d7b8d3e7c8d3e7c8d3f7d8d407e8d417e8e427f8e43808e43808e44818e45828e',
  '46828e47838e48838e48848e49858e4a858e4b868e4c868d4c878d4d888d4e888d4f898d50898d508a8d518b8d528b8d',
  '538c8d548c8d558d8d558e8d568e8d578f8d588f8d59908d5a918d5b918d5b928d5c928c5d938c5e948c5f948c60958c',
  '61958c62968c63978c64978c65988c66998c67998c689a8c699a8c6a9b8c6b9c8c6c9c8c6d9d8c6e9e8b6f9e8b719f8b',
  '72a08b73a08b74a18b75a18b76a28b77a38b79a38b7aa48a7ba48a7ca58a7da58a7ea68a80a78981a78982a88983a889',
  '84a98986a98987aa8888ab8889ab888aac888cac878dad878ead878fae8791af8792af8693b08694b08696b18697b186',
  '98b28699b3859bb3859cb4859db4859fb585a0b685a1b685a3b785a4b885a6b885a7b985a8ba85aabb85abbb85adbc85',
  'aebd85b0be85b1be85b3bf86b4c086b6c186b7c287b9c387bbc488bcc589bec689c0c78ac1c88bc3c98cc5ca8cc6cb8d',
  'c8cc8ecacd8fccce8fcdcf90cfd091d1d192d3d293d4d393d6d594d8d695dad796dbd897ddd998dfda99e1db9ae3dc9b',
  'e4dd9ce6de9de8df9eeae09fece1a0eee2a1efe4a2f1e5a3f3e6a4f5e7a5f7e8a6f9e9a7fbeaa8fcebaafeecabffedac',
].join('')

/** Stock taken off: pale is nothing, dark is most. 256 colours, six hex digits each, low first. */
const stockDigits = [
  'ececdfebebdfeaebdee9eadde8e9dce7e9dce6e8dbe5e8dae4e7d9e3e6d9e2e6d8e1e5d7dfe5d6dee4d5dde3d5dce3d4',
  'dbe2d3dae1d2d9e1d1d8e0d0d6dfd0d5dfcfd4deced3ddcdd2ddccd1dccbcfdbcacedacacddac9ccd9c8cbd8c7c9d8c6',
  'c8d7c5c7d6c4c6d5c3c4d5c2c3d4c1c2d3c0c1d2bfbfd1bfbed1bebdd0bdbccfbcbacebbb9cdbab8cdb9b7ccb8b5cbb7',
  'b4cab6b3c9b5b2c9b4b0c8b3afc7b2aec6b1adc5b0abc4afaac4aea9c3ada8c2aca6c1aba5c0aaa4bfaaa3bfa9a2bea8',
  'a0bda79fbca69ebba59dbaa49bbaa39ab9a299b8a198b7a097b69f95b59e94b59d93b49c92b39c91b29b90b19a8eb199',
  '8db0988caf978bae968aad9588ad9487ac9486ab9385aa9284a99183a99082a88f80a78e7fa68d7ea58d7da58c7ca48b',
  '7ba38a7aa28979a28878a18777a087769f86749e85739e84729d83719c83709b826f9b816e9a806d997f6c987e6b987e',
  '6a977d69967c68957b67957b66947a669379659278649277639177629076618f75608f745f8e745e8d735e8c725d8c71',
  '5c8b715b8a705a896f5a896f59886e58876d58876d57866c56856b55846a55846a548369538268538168528167518066',
  '517f66507f65507e644f7d644e7c634e7c624d7b624c7a614c7a614b79604b785f4a775f49775e49765d48755d48745c',
  '47745b46735b46725a457159457159447058436f57436e57426e56426d56416c55406b54406a543f6a533f69523e6852',
  '3e67513d66503c66503c654f3b644e3b634e3a624d3a624c39614c38604b385f4a375e4a375e49365d48365c48355b47',
  '345a463459463359453358443257443156433155423055423054412f53402f52402e513f2d503e2d4f3e2c4f3d2c4e3c',
  '2b4d3c2b4c3b2a4b3a2a4a3a294a39294938284838274737274636264536264535264434254334254233244132244032',
  '233f31233f31223e30223d2f213c2f213b2e203b2d203a2d20392c1f382c1f372b1e362a1e362a1e35291d34291d3328',
  '1c32271c32271c31261b30261b2f251a2f251a2e241a2d24192c23192b22192b22182a2118292118282017282017271f',
].join('')

/** Red, green and blue of 0 to 255. */
export type Rgb = readonly [number, number, number]

function coloursOf(digits: string): readonly Rgb[] {
  const channel = (index: number) => Number.parseInt(digits.slice(index, index + 2), 16)
  return Array.from({ length: digits.length / 6 }, (_, i) => [
    channel(i * 6),
    channel(i * 6 + 2),
    channel(i * 6 + 4),
  ])
}

const heights = coloursOf(heightDigits)
const stockTakenOff = coloursOf(stockDigits)

function at(colours: readonly Rgb[], t: number): Rgb {
  const place = Number.isNaN(t) ? 0 : Math.min(1, Math.max(0, t))
  return colours[Math.round(place * (colours.length - 1))]
}

const css = ([r, g, b]: Rgb) => `rgb(${r} ${g} ${b})`

/** Colour of a height as red, green, blue; `t` runs from 0 (lowest) to 1 (highest) and is held within. */
export function heightRgb(t: number): Rgb {
  return at(heights, t)
}

/** Colour of a height for CSS and canvas; `t` runs from 0 (lowest) to 1 (highest). */
export function heightColour(t: number): string {
  return css(heightRgb(t))
}

/** Colour of stock taken off as red, green, blue; `t` runs from 0 (nothing) to 1 (most). */
export function stockRgb(t: number): Rgb {
  return at(stockTakenOff, t)
}

/** Colour of stock taken off for CSS and canvas; `t` runs from 0 (nothing) to 1 (most). */
export function stockColour(t: number): string {
  return css(stockRgb(t))
}
