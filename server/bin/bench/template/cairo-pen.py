"""Draws pages of primitives (JSON, mm, y up) as a PDF by native cairo; prints the milliseconds of the fastest of three drawings."""
import json
import math
import sys
import time

import cairo

PT = 72 / 25.4
INKS = {
    'ink': 0x1E2B2A, 'grey': 0x586561, 'chalk': 0x1F5AA6, 'brass': 0x80600F, 'madder': 0xA8322A,
    'pale madder': 0xF7DFDB, 'rule': 0xD8D0BC, 'white': 0xFFFFFF,
}


def ink(context, name):
    value = INKS[name]
    context.set_source_rgb((value >> 16 & 255) / 255, (value >> 8 & 255) / 255, (value & 255) / 255)


def paint(context, pen, fill):
    if fill:
        ink(context, fill)
        context.fill_preserve() if pen else context.fill()
    if pen:
        ink(context, pen['colour'])
        context.set_line_width(pen['widthMm'] * PT)
        context.set_dash([d * PT for d in pen.get('dashMm') or []])
        context.stroke()


def draw(context, items, height):
    def at(p):
        return p['x'] * PT, (height - p['y']) * PT

    for item in items:
        kind = item['kind']
        if kind == 'clip':
            r = item['rect']
            context.save()
            context.rectangle(r['x'] * PT, (height - r['y'] - r['height']) * PT, r['width'] * PT, r['height'] * PT)
            context.clip()
            draw(context, item['items'], height)
            context.restore()
        elif kind == 'line':
            context.move_to(*at(item['from']))
            context.line_to(*at(item['to']))
            paint(context, item['stroke'], None)
        elif kind == 'circle':
            x, y = at(item['centre'])
            context.new_sub_path()
            context.arc(x, y, item['radiusMm'] * PT, 0, 2 * math.pi)
            context.close_path()
            paint(context, item['stroke'], item['fill'])
        elif kind == 'polyline':
            for p in item['points']:
                context.line_to(*at(p))
            if item['closed']:
                context.close_path()
            paint(context, item['stroke'], item['fill'])
        else:
            context.select_font_face('sans-serif', cairo.FONT_SLANT_NORMAL, cairo.FONT_WEIGHT_BOLD if item['weight'] == 'bold' else cairo.FONT_WEIGHT_NORMAL)
            size = item['sizeMm'] * PT
            context.set_font_size(size)
            width = context.text_extents(item['text']).x_advance
            most = item.get('maxWidthMm')
            if most and width > most * PT:
                size *= most * PT / width
                context.set_font_size(size)
                width = most * PT
            ink(context, item['colour'])
            context.save()
            context.translate(*at(item['at']))
            context.rotate(-item['turnRad'])
            context.move_to({'start': 0, 'middle': -0.5, 'end': -1}[item['anchor']] * width, 0)
            context.show_text(item['text'])
            context.restore()


def main(given, out):
    with open(given, encoding='utf8') as file:
        pages = json.load(file)
    best = math.inf
    for _ in range(3):
        started = time.perf_counter()
        surface = cairo.PDFSurface(out, 100, 100)
        context = cairo.Context(surface)
        for page in pages:
            surface.set_size(page['widthMm'] * PT, page['heightMm'] * PT)
            draw(context, page['items'], page['heightMm'])
            context.show_page()
        surface.finish()
        best = min(best, time.perf_counter() - started)
    print(best * 1000)


main(*sys.argv[1:3])
