//! The power goes, or the card fails, at every operation of every save: the next start finds the old or the new state.

use std::collections::BTreeSet;
use std::io::ErrorKind;

use deshielo::keep::Slot;

use super::disk::{Disk, Fate, Left};

/// A save takes no more operations than this; more would mean that one was missed.
const MOST_OPERATIONS: usize = 16;

/// What the next start finds on a disk.
fn found(left: &Left) -> Option<u64> {
    let opened = Slot::new("kept").open::<u64>(&mut Disk::with(left));
    assert_eq!(opened.damage, None, "a cut is no damage: {left:?}");
    opened.value
}

/// Cuts the power at every operation of keeping `new` on a disk; gives every disk that may be left.
fn cut_everywhere(start: &Left, new: u64) -> BTreeSet<Left> {
    let mut all = BTreeSet::new();
    let old = found(start);
    for at in 0..MOST_OPERATIONS {
        let (mut disk, mut slot) = (Disk::with(start), Slot::new("kept"));
        assert_eq!(slot.open::<u64>(&mut disk).value, old);
        disk.doom(at, Fate::Cut);
        let kept = slot.save(&new, &mut disk);
        for left in disk.leavings() {
            let got = found(&left);
            let fits = got == Some(new) || got == old && kept.is_err();
            assert!(fits, "{got:?} is neither {old:?} nor {new}; cut at {at} of {start:?}, left {left:?}");
            all.insert(left);
        }
        if kept.is_ok() {
            assert!(at > 3, "only {at} operations");
            return all;
        }
    }
    panic!("a save never ended");
}

#[test]
fn three_power_cuts_in_a_row_leave_the_old_or_the_new() {
    let mut disks = BTreeSet::from([Left::new()]);
    let mut tried = 0;
    // An undisturbed save or two first, so that there are copies of every age.
    for start in [0, 1, 2] {
        let (mut disk, mut slot) = (Disk::default(), Slot::new("kept"));
        (0..start).for_each(|value| assert!(slot.save(&value, &mut disk).unwrap()));
        disks.extend(disk.leavings());
    }
    for round in 0..3 {
        let mut after = BTreeSet::new();
        for start in &disks {
            after.extend(cut_everywhere(start, 100 + round));
            tried += 1;
        }
        disks = after;
    }
    assert!(tried > 50, "{tried} disks");
}

#[test]
fn a_card_that_fails_once_at_any_operation_loses_nothing() {
    let mut failures = 0;
    for half in [false, true] {
        for kind in [ErrorKind::StorageFull, ErrorKind::ReadOnlyFilesystem, ErrorKind::Other] {
            for at in 0..MOST_OPERATIONS {
                let (mut disk, mut slot) = (Disk::default(), Slot::new("kept"));
                for value in [1_u64, 2] {
                    slot.save(&value, &mut disk).unwrap();
                }
                disk.doom(at, if half { Fate::FailsHalf(kind) } else { Fate::Fails(kind) });
                let outcome = slot.save(&3_u64, &mut disk);
                failures += usize::from(outcome.is_err());
                for left in disk.leavings() {
                    assert!(matches!(found(&left), Some(2 | 3)), "{kind:?} at {at}, half {half}: {left:?}");
                }
                // The card is well again, and the power goes at any operation of the next save.
                let operations = disk.operations();
                for cut in 0..MOST_OPERATIONS {
                    let (mut disk, mut slot) = (disk.clone(), slot.clone());
                    disk.doom(cut, Fate::Cut);
                    let again = slot.save(&4_u64, &mut disk);
                    for left in disk.leavings() {
                        let got = found(&left);
                        let fits = if again.is_ok() { got == Some(4) } else { matches!(got, Some(2..=4)) };
                        assert!(fits, "{kind:?} at {at} of {operations}, half {half}, cut at {cut}: {got:?} {left:?}");
                    }
                }
                disk.doom(usize::MAX, Fate::Cut);
                slot.save(&5_u64, &mut disk).unwrap();
                assert!(disk.leavings().iter().all(|left| found(left) == Some(5)));
            }
        }
    }
    assert!(failures >= 2 * 3 * 7, "{failures}");
}

#[test]
fn the_same_is_not_written_twice() {
    let (mut disk, mut slot) = (Disk::default(), Slot::new("kept"));
    assert!(slot.save(&7_u64, &mut disk).unwrap());
    disk.doom(0, Fate::Fails(ErrorKind::Other));
    assert!(!slot.save(&7_u64, &mut disk).unwrap());
    let (mut disk, mut slot) = (disk, Slot::new("kept"));
    assert_eq!(slot.open::<u64>(&mut disk).value, Some(7));
    assert!(!slot.save(&7_u64, &mut disk).unwrap(), "nor after a start");
}
