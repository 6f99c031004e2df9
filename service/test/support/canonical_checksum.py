"""Checksum of a JSON content, written from reference/decisions/0010-canonical-form-and-checksum.md alone.

Reads one JSON value per line and prints one checksum per line.
"""
import hashlib
import json
import sys

SHORT_ESCAPES = {'"': '\\"', '\\': '\\\\', '\b': '\\b', '\t': '\\t', '\n': '\\n', '\f': '\\f', '\r': '\\r'}


def write_string(text):
    parts = []
    for character in text:
        if character in SHORT_ESCAPES:
            parts.append(SHORT_ESCAPES[character])
        elif ord(character) < 0x20:
            parts.append('\\u%04x' % ord(character))
        else:
            parts.append(character)
    return '"' + ''.join(parts) + '"'


def write_number(value):
    value = float(value)
    if value == 0:
        return '0'
    if value < 0:
        return '-' + write_number(-value)
    mantissa, _, exponent = ('%s' % repr(value)).partition('e')
    whole, _, fraction = mantissa.partition('.')
    digits = whole + ('' if fraction == '0' and not exponent else fraction)
    n = len(whole) + int(exponent or 0)
    stripped = digits.lstrip('0')
    n -= len(digits) - len(stripped)
    digits = stripped.rstrip('0')
    k = len(digits)
    if k <= n <= 21:
        return digits + '0' * (n - k)
    if 0 < n <= 21:
        return digits[:n] + '.' + digits[n:]
    if -6 < n <= 0:
        return '0.' + '0' * -n + digits
    power = n - 1
    rest = '.' + digits[1:] if k > 1 else ''
    return '%s%se%s%d' % (digits[0], rest, '+' if power >= 0 else '-', abs(power))


def write(value):
    if value is None:
        return 'null'
    if value is True or value is False:
        return 'true' if value else 'false'
    if isinstance(value, str):
        return write_string(value)
    if isinstance(value, list):
        return '[' + ','.join(write(item) for item in value) + ']'
    if isinstance(value, dict):
        names = sorted(value, key=lambda name: name.encode('utf-16-be'))
        return '{' + ','.join(write_string(name) + ':' + write(value[name]) for name in names) + '}'
    return write_number(value)


for line in sys.stdin.buffer.read().decode('utf-8').splitlines():
    print(hashlib.sha256(write(json.loads(line)).encode('utf-8')).hexdigest())
