import { fileURLToPath } from 'node:url';
import { renderAsync } from '@resvg/resvg-js';
import * as echarts from 'echarts';
import type { EChartsOption } from 'echarts';

export interface Picture {
  png: Buffer;
  /** Size at which it is shown [px]; the picture itself has twice the pixels. */
  width: number;
  height: number;
}

const SCALE = 2;
const fonts = ['400Regular/Arimo_400Regular.ttf', '700Bold/Arimo_700Bold.ttf'].map((file) =>
  fileURLToPath(import.meta.resolve(`@expo-google-fonts/arimo/${file}`)),
);

/**
 * Draws a chart without a browser: to SVG, then to PNG with a font that is brought along, so that bytes never differ.
 * The PNG is made beside the event loop, which has heartbeats and requests to look after.
 */
export async function renderPng(option: EChartsOption, width: number, height: number): Promise<Picture> {
  const chart = echarts.init(null, null, { renderer: 'svg', ssr: true, width, height });
  try {
    chart.setOption({ animation: false, textStyle: { fontFamily: 'Arimo' }, backgroundColor: '#ffffff', ...option });
    const svg = chart.renderToSVGString();
    const picture = await renderAsync(svg, {
      fitTo: { mode: 'width', value: SCALE * width },
      font: { loadSystemFonts: false, fontFiles: fonts, defaultFontFamily: 'Arimo' },
    });
    return { png: Buffer.from(picture.asPng()), width, height };
  } finally {
    chart.dispose();
  }
}
