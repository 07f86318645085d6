import type { CalibrationView } from './calibrations.repository';
import type { CalibrationDto } from './dto/calibration.dto';

export function toCalibrationDto({ calibration, createdByName }: CalibrationView): CalibrationDto {
  const { shopId: _shopId, createdBy: _createdBy, createdAt, ...values } = calibration;
  return { ...values, createdAt: createdAt.toISOString(), createdByName };
}
