import type { DeviceId, PersonId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';
import { DeviceEntity } from './device.entity';
import { PERSON_COLUMNS, toKnownPerson, type KnownPerson, type PersonRow } from './people.repository';

export class DevicesRepository {
  /** The person whose device this is, when the credential's hash is right and it is neither expired nor revoked. */
  async findPersonByCredential(
    context: Context,
    deviceId: DeviceId,
    credentialHash: string,
  ): Promise<KnownPerson | null> {
    const rows: PersonRow[] = await managerOf(context).query(
      `SELECT ${PERSON_COLUMNS} FROM device d JOIN person p ON p.id = d.person_id JOIN company c ON c.id = p.company_id
        WHERE d.id = ? AND d.credential_hash = ? AND d.revoked_at IS NULL AND d.expires_at > UTC_TIMESTAMP(3)
          AND p.is_active = 1`,
      [deviceId, credentialHash],
    );
    return rows[0] ? toKnownPerson(rows[0]) : null;
  }

  async isDeviceOf(context: Context, deviceId: DeviceId, personId: PersonId): Promise<boolean> {
    return managerOf(context).exists(DeviceEntity, { where: { id: deviceId, personId } });
  }

  /** Takes up an old device of the person again with a new credential; `false` when there is none to take up. */
  async renew(
    context: Context,
    deviceId: DeviceId,
    personId: PersonId,
    change: { credentialHash: string; expiresAt: Date; label: string },
  ): Promise<boolean> {
    const result = await managerOf(context)
      .createQueryBuilder()
      .update(DeviceEntity)
      .set(change)
      .where('id = :deviceId AND person_id = :personId AND revoked_at IS NULL', { deviceId, personId })
      .execute();
    return (result.affected ?? 0) > 0;
  }

  async extend(context: Context, deviceId: DeviceId, expiresAt: Date): Promise<void> {
    await managerOf(context).update(DeviceEntity, { id: deviceId }, { expiresAt });
  }

  async expire(context: Context, deviceId: DeviceId): Promise<void> {
    await managerOf(context).update(DeviceEntity, { id: deviceId }, { expiresAt: new Date() });
  }

  async insert(context: Context, device: Omit<DeviceEntity, 'lastCount' | 'revokedAt'>): Promise<void> {
    await managerOf(context).insert(DeviceEntity, { ...device, lastCount: 0, revokedAt: null });
  }

  /** The highest count that has arrived from the device: its own counter must go on above it. */
  async findLastCount(context: Context, deviceId: DeviceId): Promise<number> {
    const rows: { lastCount: number | null }[] = await managerOf(context).query(
      'SELECT MAX(device_count) AS lastCount FROM entry WHERE device_id = ?',
      [deviceId],
    );
    return rows[0]?.lastCount ?? 0;
  }
}
