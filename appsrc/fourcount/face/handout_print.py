"""The page on a printer: the same drawing, as large as on screen, centred where the printer's sheet is another one."""

from __future__ import annotations

from pathlib import Path

from PySide6.QtGui import QPainter
from PySide6.QtPrintSupport import QPrinter
from PySide6.QtWidgets import QWidget

from fourcount.face import handout_dialogs
from fourcount.ink.handout import Handout
from fourcount.ink.handout_file import page_layout
from fourcount.record.entry.digits import specimen
from fourcount.wording import handout_labels as labels


def print_page(parent: QWidget, page: Handout) -> str:
    """Ask for a printer and print; one sentence of how it went, "" where nobody wanted to."""
    printer = QPrinter(QPrinter.PrinterMode.HighResolution)
    printer.setPageLayout(page_layout(page.paper))
    printer.setFullPage(True)
    printer.setDocName(page.words.title)
    printer.setCreator("Fourcount")
    if not handout_dialogs.ask_printer(parent, printer):
        return ""
    if not draw_on(printer, page):
        return labels.NOT_PRINTED
    file = printer.outputFileName()
    return labels.SAVED.format(name=specimen(Path(file).name)) if file else labels.PRINTED


def draw_on(printer: QPrinter, page: Handout) -> bool:
    """Draw the page on a printer whose sheet may be another than the page's; whether it was taken."""
    printer.setFullPage(True)
    painter = QPainter()
    if not painter.begin(printer):
        return False
    width, height = page.size
    sheet = printer.paperRect(QPrinter.Unit.DevicePixel)
    scale = min(sheet.width() / width, sheet.height() / height)
    painter.translate((sheet.width() - width * scale) / 2, (sheet.height() - height * scale) / 2)
    painter.scale(scale, scale)
    page.draw(painter)
    return painter.end()
