"""The window, its session and its settings."""
