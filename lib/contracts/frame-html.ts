const escaped = (text: string) => text.replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`)

/** The frame of a link, of which `page` is the address, as it is written into another page. */
export const frameHtml = (page: string, title: string, width: number, height: number) =>
  `<iframe src="${escaped(page.replace('/s/', '/embed/'))}" title="${escaped(title)}" width="${width}" height="${height}" ` +
  'style="border:0" loading="lazy" referrerpolicy="no-referrer"></iframe>'
