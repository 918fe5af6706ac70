"""How long it takes to paint both arrays of ten thousand icons: the first time, again, and with one call an icon.

Times are in milliseconds, of a picture some 1,100 pixels wide, on a screen of ordinary and of twice the pixels. "again"
is what every repaint costs, "first" that of a picture whose icons nobody has drawn yet.
"""

from __future__ import annotations

import json
import statistics
import time

from PySide6.QtCore import QRectF, QSize
from PySide6.QtGui import QColor, QFont, QImage, QPainter
from PySide6.QtWidgets import QApplication

from fourcount.ink.arrays import lay_array
from fourcount.ink.palette import LIGHT
from fourcount.ink.people import draw_icon
from fourcount.ink.picture import Picture
from fourcount.picture.plan import plan_on
from fourcount.wording.picture_words import KeyEntry, PictureWords, Side

WIDTH, AGAIN = 1_100, 30
PLAN = plan_on(10_000, 0.4321, 0.2345, 0.2011, 0.2789)  # every state is drawn, and no row or block ends with one
WORDS = PictureWords(
    without=Side("Without: usual care", "4,321 in 10,000", "(43.21%)", "5,679 did not fall"),
    with_=Side("With: night lights", "2,345 in 10,000", "(23.45%)", "7,655 did not fall"),
    key=(KeyEntry("affected", "fell"), KeyEntry("avoided", "falls avoided"), KeyEntry("others", "did not fall")),
    note="Each picture shows 10,000 people.",
    lines=(),
)


class Plain:
    """The smallest style there is."""

    palette = LIGHT

    def font(self, _role: str) -> QFont:
        return QFont()

    def px(self, pixels: float) -> int:
        return round(pixels)


def painted(picture: Picture, ratio: int) -> float:
    """Milliseconds of one painting."""
    style = Plain()
    image = QImage(QSize(WIDTH, 700) * ratio, QImage.Format.Format_RGB32)
    image.setDevicePixelRatio(ratio)
    image.fill(QColor(LIGHT.page))
    painter = QPainter(image)
    start = time.perf_counter()
    picture.draw(painter, style, 0, 0, WIDTH)
    taken = time.perf_counter() - start
    painter.end()
    return taken * 1000


def one_by_one() -> float:
    """Milliseconds of both arrays with one call an icon."""
    laid = lay_array(10_000, (WIDTH - 28) / 2, 6)
    image = QImage(WIDTH, 700, QImage.Format.Format_RGB32)
    painter = QPainter(image)
    start = time.perf_counter()
    for array in (PLAN.without, PLAN.with_):
        for state, first, stop in array.runs():
            for icon in range(first, stop):
                column, row = laid.grid.place(icon)
                draw_icon(
                    painter, QRectF(laid.x(column), laid.y(row), laid.across, laid.down), state, LIGHT, specks=True
                )
    taken = time.perf_counter() - start
    painter.end()
    return taken * 1000


def main() -> None:
    application = QApplication([])
    picture = Picture(PLAN, WORDS)
    painted(Picture(plan_on(100, 0.12, 0.12), WORDS), 1)  # fonts are loaded
    values = {}
    for name, ratio in (("", 1), ("_sharp", 2)):
        values[f"first{name}"] = painted(picture, ratio)
        values[f"again{name}"] = statistics.median(painted(picture, ratio) for _ in range(AGAIN))
    values["one_by_one"] = one_by_one()
    print(json.dumps(values))
    del application


if __name__ == "__main__":
    main()
