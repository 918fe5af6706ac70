"""The two questions of the handout's window: where to save, and which printer."""

from __future__ import annotations

from pathlib import Path

from PySide6.QtPrintSupport import QPrintDialog, QPrinter
from PySide6.QtWidgets import QFileDialog, QWidget

from fourcount.wording import handout_labels as labels


def ask_path(parent: QWidget, name: str) -> str:
    """Ask where to save; "" where nothing was chosen. A name without a suffix gets that of the kind chosen."""
    path, kind = QFileDialog.getSaveFileName(
        parent, labels.SAVE_TITLE, f"{name}.pdf", ";;".join(labels.FILTERS.values())
    )
    if path and not Path(path).suffix:
        path += next((suffix for suffix, said in labels.FILTERS.items() if said == kind), ".pdf")
    return path


def ask_printer(parent: QWidget, printer: QPrinter) -> bool:
    """Let the reader choose a printer; whether to print."""
    return QPrintDialog(printer, parent).exec() == QPrintDialog.DialogCode.Accepted
