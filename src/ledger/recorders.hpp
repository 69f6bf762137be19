#pragma once

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>
#include <vector>

#include "ledger/run_on.hpp"
#include "rainledger/ledger/ledger.hpp"
#include "rainledger/rain/hyetograph.hpp"

// What listens to a march: the full ledger, and totals only.
namespace rainledger {

/// A sum that carries its rounding errors along (Neumaier 1974), so that a total over 10^5 steps is
/// as good as one over ten.
class CarefulSum {
public:
    void add(double value) {
        const double sum = sum_ + value;
        lost_ += std::abs(sum_) >= std::abs(value) ? (sum_ - sum) + value : (value - sum) + sum_;
        sum_ = sum;
    }
    [[nodiscard]] double value() const { return sum_ + lost_; }

private:
    double sum_ = 0.0;
    double lost_ = 0.0;
};

/// Running totals of the accounts.
class AccountTotals {
public:
    void add(const Accounts& step) {
        rain_.add(step.rain_mm);
        run_on_.add(step.run_on_mm);
        initial_loss_.add(step.initial_loss_mm);
        infiltrated_.add(step.infiltrated_mm);
        excess_.add(step.excess_mm);
        ponded_mm_ = step.ponded_mm;
    }
    [[nodiscard]] Accounts total() const {
        return {rain_.value(),        run_on_.value(), initial_loss_.value(),
                infiltrated_.value(), ponded_mm_,      excess_.value()};
    }

private:
    CarefulSum rain_;
    CarefulSum run_on_;
    CarefulSum initial_loss_;
    CarefulSum infiltrated_;
    CarefulSum excess_;
    double ponded_mm_ = 0.0;
};

/// By how much the books of a step, or of a whole storm, do not balance: left less right.
inline double imbalance_mm(const Accounts& accounts, double ponded_before_mm) {
    return accounts.rain_mm + accounts.run_on_mm -
           (accounts.initial_loss_mm + accounts.infiltrated_mm +
            (accounts.ponded_mm - ponded_before_mm) + accounts.excess_mm);
}

/// Keeps the whole ledger of a surface, and its outflow where a receiver wants it.
class LedgerRecorder {
public:
    LedgerRecorder(const Hyetograph& rain, RateSeries* outflow) : rain_(rain), outflow_(outflow) {
        ledger_.rows.reserve(rain.steps());
    }

    void step_begins(std::size_t step) { start_h_ = rain_.edges_h[step]; }

    void ponding_starts(double h) {
        // A pond that ends and starts at one instant has not ended.
        if (!ledger_.ponding.empty() && ledger_.ponding.back().end_h == start_h_ + h) {
            ledger_.ponding.back().end_h.reset();
        } else {
            ledger_.ponding.push_back({start_h_ + h, std::nullopt});
        }
    }
    void ponding_ends(double h) {
        PondedInterval& interval = ledger_.ponding.back();
        interval.end_h = start_h_ + h;
        if (*interval.end_h <= interval.start_h) ledger_.ponding.pop_back();
    }
    void runoff_starts(double h) { ledger_.runoff_start_h = start_h_ + h; }

    void outflow(double end_h, double rate) {
        if (outflow_ != nullptr) outflow_->add(end_h, rate);
    }

    template <class Capacity>
    void step_ends(std::size_t step, const Accounts& accounts, const Capacity& capacity) {
        ledger_.closure_mm =
            std::max(ledger_.closure_mm, std::abs(imbalance_mm(accounts, ponded_before_mm_)));
        ponded_before_mm_ = accounts.ponded_mm;
        totals_.add(accounts);
        ledger_.rows.push_back({accounts, capacity()});
        if (outflow_ != nullptr) outflow_->end_step(rain_.duration_h[step]);
    }

    [[nodiscard]] SurfaceLedger finish() {
        ledger_.total = totals_.total();
        ledger_.closure_mm =
            std::max(ledger_.closure_mm, std::abs(imbalance_mm(ledger_.total, 0.0)));
        return std::move(ledger_);
    }

private:
    const Hyetograph& rain_;
    RateSeries* outflow_;
    SurfaceLedger ledger_;
    AccountTotals totals_;
    double start_h_ = 0.0;
    double ponded_before_mm_ = 0.0;
};

/// Keeps totals and nothing else; plain sums, for speed.
class TotalsRecorder {
public:
    void step_begins(std::size_t /*step*/) {}
    void ponding_starts(double /*h*/) {}
    void ponding_ends(double /*h*/) {}
    void runoff_starts(double /*h*/) {}
    void outflow(double /*end_h*/, double /*rate*/) {}
    template <class Capacity>
    void step_ends(std::size_t /*step*/, const Accounts& accounts, const Capacity& /*capacity*/) {
        total_.rain_mm += accounts.rain_mm;
        total_.run_on_mm += accounts.run_on_mm;
        total_.initial_loss_mm += accounts.initial_loss_mm;
        total_.infiltrated_mm += accounts.infiltrated_mm;
        total_.ponded_mm = accounts.ponded_mm;
        total_.excess_mm += accounts.excess_mm;
    }
    [[nodiscard]] Accounts total() const { return total_; }

private:
    Accounts total_;
};

}  // namespace rainledger
