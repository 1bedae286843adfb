import { Caution } from '@/components/ui/Caution';

/** What can hurt while frames are taken, in one line; whether a set-up may be used is for the laser safety officer to say. */
export function CaptureCautions({ laserClass }: { laserClass?: string }) {
  const named = laserClass ? `Laser class ${laserClass}. ` : '';
  return (
    <Caution icon="eyewear">
      {`${named}Eyewear and enclosure as your laser safety officer rules; local codes and IEC 60825-1 come first. Close the shutter before you swap the piece. Attenuate before the sensor.`}
    </Caution>
  );
}
