/** An address as it is sent, from `addresses a`. */
export const addressJson = `json_build_object('id', a.id, 'label', a.label, 'line', a.line, 'city', a.city, 'postcode', a.postcode,
  'area', a.area, 'lat', a.lat, 'lng', a.lng, 'gateCode', a.gate_code, 'accessNotes', a.access_notes, 'hasWater', a.has_water,
  'hasPower', a.has_power, 'hasDog', a.has_dog, 'shutsGate', a.shuts_gate, 'takesKey', a.takes_key, 'keyGoesBack', a.key_goes_back,
  'drain', a.drain, 'washWater', a.wash_water, 'permitNumber', a.permit_number, 'permitUntil', a.permit_until,
  'ownerConsentBy', a.owner_consent_by, 'ownerConsentOn', a.owner_consent_on, 'mustKnow', a.must_know)`;

/** A vehicle as it is sent, from `vehicles v`. */
export const vehicleJson = `json_build_object('id', v.id, 'label', v.label, 'year', v.year, 'make', v.make, 'model', v.model,
  'color', v.color, 'plate', v.plate, 'vin', v.vin, 'sizeClass', v.size_class, 'wheelFinish', v.wheel_finish, 'paint', v.paint,
  'interior', v.interior, 'notes', v.notes, 'isCoated', v.is_coated, 'mustKnow', v.must_know)`;
