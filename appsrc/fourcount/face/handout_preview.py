"""The page as it will be printed, as large as the window has room for it."""

from __future__ import annotations

from PySide6.QtCore import Qt
from PySide6.QtGui import QImage, QPainter, QPaintEvent, QPen
from PySide6.QtWidgets import QWidget

from fourcount.face.look import Look
from fourcount.ink.handout import Handout, NoPage
from fourcount.ink.handout_file import page_image
from fourcount.wording import handout_labels as labels

PREVIEW_DOTS = 200
"""The preview is drawn this fine and made smaller, so that it shows what paper will show."""


class Preview(QWidget):
    """The page as one object: a picture of it, and all that it says as its description."""

    def __init__(self, look: Look) -> None:
        super().__init__()
        self._look = look
        self._fine = QImage()
        self._shown = QImage()
        self.setFocusPolicy(Qt.FocusPolicy.StrongFocus)
        self.setAccessibleName(labels.PREVIEW_NAME)

    def show_page(self, page: Handout | NoPage) -> None:
        """Show a page, or nothing where there is none."""
        drawn = isinstance(page, Handout)
        self._fine = page_image(page, PREVIEW_DOTS) if isinstance(page, Handout) else QImage()
        self.setAccessibleDescription(page.words.description if isinstance(page, Handout) else page.sentence)
        self.setVisible(drawn)
        self._shown = QImage()
        self.fit(self.width())

    def fit(self, width: int) -> None:
        """Be as wide as there is room, and as high as the page is then."""
        if not self._fine.isNull():
            self.setFixedSize(width, round(width * self._fine.height() / self._fine.width()))
        self.update()

    def paintEvent(self, event: QPaintEvent) -> None:
        if self._fine.isNull():
            return
        ratio = self.devicePixelRatioF()
        wanted = self.size() * ratio
        if self._shown.size() != wanted:
            smooth = Qt.TransformationMode.SmoothTransformation
            self._shown = self._fine.scaled(wanted, Qt.AspectRatioMode.IgnoreAspectRatio, smooth)
            self._shown.setDevicePixelRatio(ratio)
        painter = QPainter(self)
        painter.drawImage(0, 0, self._shown)
        focused = self.hasFocus()
        painter.setPen(QPen(self._look.colour("accent" if focused else "hairline"), 2 if focused else 1))
        painter.drawRect(self.rect().adjusted(0, 0, -1, -1))
        painter.end()
