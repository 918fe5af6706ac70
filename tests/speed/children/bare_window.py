"""A bare PySide6 window of the same size: from the start of the interpreter to the end of its first paint."""

from __future__ import annotations

import sys

from first_paint import SIZE, FirstPaint, report
from PySide6.QtWidgets import QApplication, QMainWindow

if "scipy" in sys.argv[1:]:
    import scipy.special  # noqa: F401  what any program with these figures loads

application = QApplication([])
window = QMainWindow()
window.resize(*SIZE)


def _done() -> None:
    report()
    application.quit()


watch = FirstPaint(window, _done)
window.show()
sys.exit(application.exec())
