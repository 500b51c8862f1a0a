"""A bare socket for batches and answers, beside grpc: for a few rows a call of
grpc costs more than the law. A message goes as its length in 4 bytes,
little-endian, and its bytes."""

import os
import socket
import struct
import sys
import threading

FEATURE = "direct"
_HEAD = struct.Struct("<I")
_MOST = 1 << 30  # bytes of a message


class Direct:
    """The socket of a law, in the host's folder for sockets."""

    def __init__(self, answer):
        """answer: a function from the bytes of a Batch to those of its Result."""
        self.answer, self.path, self._lock = answer, "", threading.Lock()

    def open(self):
        """Listens, if it does not yet, and returns where; "" if it cannot."""
        folder = os.environ.get("PLUGIN_UNIX_SOCKET_DIR")
        with self._lock:
            if self.path or not folder:
                return self.path
            try:
                listener = socket.socket(socket.AF_UNIX, socket.SOCK_STREAM)
                path = os.path.join(folder, "direct-%d" % os.getpid())
                listener.bind(path)
                listener.listen()
            except OSError as e:
                print("wanelaw: no socket of its own: %s" % e, file=sys.stderr)  # grpc is still there
                return ""
            self.path = path
            threading.Thread(target=self._accept, args=(listener,), daemon=True).start()
            return path

    def _accept(self, listener):
        while True:
            connection, _ = listener.accept()
            threading.Thread(target=self._converse, args=(connection,), daemon=True).start()

    def _converse(self, connection):
        connection.setsockopt(socket.SOL_SOCKET, socket.SO_SNDBUF, 1 << 20)  # as much as the system allows
        buffer = bytearray(16 << 10)
        with connection:
            try:
                while True:
                    got = _at_least(connection, buffer, 0, _HEAD.size)
                    end = _HEAD.size + _HEAD.unpack_from(buffer)[0]
                    if not got or end > _MOST:
                        return
                    if end > len(buffer):
                        buffer.extend(bytes(end + end // 4 - len(buffer)))
                    if _at_least(connection, buffer, got, end) != end:
                        return
                    result = self.answer(bytes(memoryview(buffer)[_HEAD.size:end]))
                    connection.sendall(_HEAD.pack(len(result)) + result)
            except OSError:
                return  # the host hung up


def _at_least(connection, buffer, got, wanted):
    """Reads until so many bytes are in the buffer, and returns how many are; 0
    once the other side has hung up."""
    view = memoryview(buffer)
    while got < wanted:
        n = connection.recv_into(view[got:])
        if n == 0:
            return 0
        got += n
    return got
