"""What every test stands on: no screen, no network, no settings of the reader's own, the same examples each time."""

from __future__ import annotations

import os
import socket
import sys
from pathlib import Path
from typing import Any, NoReturn

import pytest
from hypothesis import settings

ON_REAL_SCREEN = os.environ.get("QT_QPA_PLATFORM") == "xcb"
if not ON_REAL_SCREEN:
    os.environ["QT_QPA_PLATFORM"] = "offscreen"
# Qt warns under a locale that is not UTF-8, and a warning of Qt's fails a test.
os.environ["LC_ALL"] = "C.UTF-8"
for name in ("QT_SCALE_FACTOR", "QT_FONT_DPI", "QT_STYLE_OVERRIDE", "QT_QPA_PLATFORMTHEME"):
    os.environ.pop(name, None)

settings.register_profile("fourcount", derandomize=True, deadline=None)
settings.load_profile("fourcount")


def pytest_collection_modifyitems(items: list[pytest.Item]) -> None:
    """Leave the tests of a real window out where no screen was asked for."""
    if ON_REAL_SCREEN:
        return
    left_out = pytest.mark.skip(reason="needs QT_QPA_PLATFORM=xcb and a window manager")
    for item in items:
        if item.get_closest_marker("real_window"):
            item.add_marker(left_out)


@pytest.fixture(autouse=True)
def _own_folders(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    """Settings and the log of errors of each test in a folder of its own."""
    monkeypatch.setenv("FOURCOUNT_SETTINGS_FOLDER", str(tmp_path / "settings"))
    for folder in ("CONFIG", "DATA", "STATE"):
        monkeypatch.setenv(f"XDG_{folder}_HOME", str(tmp_path / folder.lower()))


@pytest.fixture(autouse=True, scope="session")
def _clipboard_left_empty() -> Any:
    """Leave nothing of Python's on the offscreen clipboard: Qt frees it after the interpreter is gone, and aborts."""
    yield
    gui = sys.modules.get("PySide6.QtGui")
    if gui and gui.QGuiApplication.instance():
        gui.QGuiApplication.clipboard().clear()


@pytest.fixture(autouse=True, scope="session")
def _no_network() -> Any:
    """Refuse every connection that would leave the machine."""

    def refuse(self: socket.socket, address: object) -> NoReturn:
        raise AssertionError(f"a test tried to reach {address}")

    with pytest.MonkeyPatch.context() as patch:
        patch.setattr(socket.socket, "connect", refuse)
        yield
