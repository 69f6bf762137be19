#pragma once

#include <algorithm>
#include <cmath>

// Cutting a stretch of varying excess into parts whose mean rates stand for it.
//
// Run-on is handed over as rates held constant over parts. The volume of a part is exact, so the
// receiver's cumulative supply is right at every part's edge and differs from the true one only
// inside. Where the rate moves one way from r0 to r1 over a part of length h, that difference is at
// most |r1 - r0| h/4. No account of a receiver, whose capacity never rises with its infiltrated
// depth, can be off by more than twice the largest difference: so the parts are bounded beforehand,
// part by part, instead of comparing marches with more and fewer of them, which can agree by
// chance.
namespace rainledger {

/// Halvings of a stretch where its rate varies throughout: at most 16384 parts.
inline constexpr int kMostHalvings = 14;

/// Halvings in all, where the rate jumps: down to the last bits of an instant.
inline constexpr int kMostJumpHalvings = 48;

/// Longest part of a rate that varies, h: an event of the receiver falls within the right part, so
/// its instant is as good as the part is short.
inline constexpr double kLongestPart = 1.0 / 3600.0;

/// Cuts [0, length_h] into parts with |r1 - r0| h/4 <= allowed_mm, a second at most where that is
/// not a millionth of it. `rate_after(h)` gives the rate (mm/h, monotone) at time h from the start
/// of the next part; `take(h)` is called for each part in turn and moves that start. Returns the
/// largest |r1 - r0| h/4 of any part: above `allowed_mm` only where the halvings were used up.
template <class RateAfter, class Take>
double for_each_part(double length_h, double allowed_mm, const RateAfter& rate_after,
                     const Take& take) {
    double coarsest = 0.0;
    const auto halve = [&](const auto& self, double h, double first_rate, double last_rate,
                           int halvings, double parent_change) -> void {
        const double change = std::abs(last_rate - first_rate);
        const double difference = 0.25 * change * h;
        // A jump stays whole in one half; a rate that varies throughout does not.
        const bool jumps = change > 0.9 * parent_change;
        const int most = jumps ? kMostJumpHalvings : kMostHalvings;
        const bool short_enough = h <= kLongestPart || difference <= 1.0e-6 * allowed_mm;
        if ((difference <= allowed_mm && short_enough) || halvings >= most) {
            coarsest = std::max(coarsest, difference);
            take(h);
            return;
        }
        const double middle_rate = rate_after(0.5 * h);
        self(self, 0.5 * h, first_rate, middle_rate, halvings + 1, change);
        self(self, 0.5 * h, middle_rate, last_rate, halvings + 1, change);
    };
    halve(halve, length_h, rate_after(0.0), rate_after(length_h), 0, 0.0);
    return coarsest;
}

}  // namespace rainledger
