import type jsQR from "jsqr";
import { useEffect, useRef, useState } from "react";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";

/** Between two looks at the picture, ms, and the width that it is looked at in, px. */
const PAUSE = 150;
const WIDTH = 640;

const REFUSED: Record<string, string> = {
  NotAllowedError: "The camera is not allowed here. Allow it in the settings of the browser, or type the lot.",
  NotFoundError: "This device has no camera. Type the lot, or use a hand-held scanner.",
};
const BUSY = "The camera does not start: another program may have it. Type the lot, or use a hand-held scanner.";

/** Finds a lot by the code on its box or on its sheet, with the camera of the device; what reads the code comes when it is asked for. */
export function CameraFinder() {
  const able = useInBrowser() && "mediaDevices" in navigator;
  const [on, setOn] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  if (!able) return null;
  return (
    <div className="mt-4">
      {on ? (
        <>
          <Viewer
            onFault={(name) => {
              setOn(false);
              setFault(REFUSED[name] ?? BUSY);
            }}
          />
          <button type="button" className="btn mt-2 min-h-27 w-full text-figure" onClick={() => setOn(false)}>
            Stop the camera
          </button>
        </>
      ) : (
        <button
          type="button"
          className="btn min-h-27 w-full text-figure"
          onClick={() => {
            setFault(null);
            setOn(true);
          }}
        >
          Read a code with the camera
        </button>
      )}
      {fault !== null && (
        <p role="alert" className="mt-2 text-lead font-semibold text-stop">
          {fault}
        </p>
      )}
    </div>
  );
}

/** The camera's picture, looked at until it holds a code, which then leads on. */
function Viewer({ onFault }: { onFault: (name: string) => void }) {
  const video = useRef<HTMLVideoElement>(null);
  const tell = useRef(onFault);
  useEffect(() => {
    tell.current = onFault;
  });
  useEffect(() => {
    let over = false;
    let stream: MediaStream | null = null;
    const look = async () => {
      const [{ default: read }, picture] = await Promise.all([
        import("jsqr"),
        navigator.mediaDevices.getUserMedia({ video: { facingMode: "environment" }, audio: false }),
      ]);
      stream = picture;
      const seen = video.current;
      if (over || !seen) return stop(picture);
      seen.srcObject = picture;
      await seen.play();
      while (!over) {
        const code = codeIn(seen, read);
        if (code !== null) return window.location.assign(`/floor?lot=${encodeURIComponent(code)}`);
        await new Promise((done) => setTimeout(done, PAUSE));
      }
    };
    look().catch((error: unknown) => {
      if (!over) tell.current(error instanceof Error ? error.name : "");
    });
    return () => {
      over = true;
      if (stream) stop(stream);
    };
  }, []);
  return (
    <video
      ref={video}
      muted
      playsInline
      aria-label="What the camera sees"
      className="aspect-video max-h-[60vh] w-full border border-ink bg-ink object-contain"
    />
  );
}

const stop = (stream: MediaStream) => {
  for (const track of stream.getTracks()) track.stop();
};

/** The text of the code that a picture holds, if it holds one. */
function codeIn(video: HTMLVideoElement, read: typeof jsQR): string | null {
  const { videoWidth, videoHeight } = video;
  if (videoWidth === 0) return null;
  const scale = Math.min(1, WIDTH / videoWidth);
  const canvas = document.createElement("canvas");
  canvas.width = Math.round(videoWidth * scale);
  canvas.height = Math.round(videoHeight * scale);
  const drawing = canvas.getContext("2d");
  if (!drawing) return null;
  drawing.drawImage(video, 0, 0, canvas.width, canvas.height);
  const { data, width, height } = drawing.getImageData(0, 0, canvas.width, canvas.height);
  const text = read(data, width, height)?.data.trim();
  return text === undefined || text === "" ? null : text.slice(0, 200);
}
