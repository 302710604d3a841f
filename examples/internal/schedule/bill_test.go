package schedule

import (
	"bytes"
	"encoding/csv"
	"math/rand/v2"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/assert"
	"github.com/stretchr/testify/require"

	mc "example.org/motorcircuit"
)

const onePrice = "kind,item,unit_price\nraceway,EMT 1/2,3.25\n"

// bills runs takeoff over a schedule.
func bills(t *testing.T, in string, args ...string) (status int, out, complaint string) {
	t.Helper()
	var stdout, stderr bytes.Buffer
	status = RunTakeoff(onePrice, append(args, "-"), strings.NewReader(in), &stdout, &stderr)
	return status, stdout.String(), stderr.String()
}

// summed reads a bill as CSV: amounts by kind, item and unit.
func summed(t *testing.T, out string) map[string]decimal.Decimal {
	t.Helper()
	rows, err := csv.NewReader(strings.NewReader(out)).ReadAll()
	require.NoError(t, err)
	require.Equal(t, []string{"kind", "item", "unit", "amount"}, rows[0][:4])
	amounts := map[string]decimal.Decimal{}
	for _, row := range rows[1:] {
		key := strings.Join(row[:3], "|")
		require.NotContains(t, amounts, key, "a line stands once")
		amounts[key] = decimal.RequireFromString(row[3])
	}
	return amounts
}

// The bill of a schedule is the sum of its results' quantities, whatever the order
// of the rows.
func TestBillIsTheSumOfItsRows(t *testing.T) {
	lines := strings.Split(strings.TrimSpace(sample), "\n")
	want := map[string]decimal.Decimal{}
	rows, err := openSheet(motors, strings.NewReader(sample))
	require.NoError(t, err)
	for {
		r, err := rows.next()
		if err != nil {
			break
		}
		result, err := mc.Size(r.value.Circuit)
		if err != nil {
			continue
		}
		for _, q := range result.Quantities() {
			key := q.Kind + "|" + q.Item + "|" + q.Unit
			want[key] = want[key].Add(q.Amount)
		}
	}
	require.Greater(t, len(want), 50)
	rnd := rand.New(rand.NewPCG(5, 6))
	var first string
	for range 3 {
		rnd.Shuffle(len(lines)-1, func(i, j int) { lines[i+1], lines[j+1] = lines[j+1], lines[i+1] })
		status, out, complaint := bills(t, strings.Join(lines, "\n"), "-format", "csv")
		assert.Equal(t, someBad, status)
		assert.Contains(t, complaint, "WH-06 spare pump is left out: ")
		got := summed(t, out)
		assert.Len(t, got, len(want))
		for key, amount := range want {
			assert.True(t, amount.Equal(got[key]), "%s: %v, want %v", key, got[key], amount)
		}
		if first == "" {
			first = out
		}
		assert.Equal(t, first, out)
	}
}

// A feeder adds its own run: (25 + 1.5) × 3 of conductor beside the motor's.
func TestBillWithFeeders(t *testing.T) {
	path := filepath.Join(t.TempDir(), "feeders.csv")
	require.NoError(t, os.WriteFile(path, []byte("tag,code,termination_c,length_m\nF,NEC-2023,75,25\n"), 0o600))
	motor := "tag,code,kind,power,volts,termination_c,length_m,feeder\nM,NEC-2023,squirrel_cage,7-1/2 hp,460,75,40,F\n"
	status, out, _ := bills(t, motor, "-format", "csv", "-feeders", path)
	require.Equal(t, allGood, status)
	got := summed(t, out)
	assert.Equal(t, "204", got["conductor|14 AWG copper THWN|m"].String()) // 124.5 + 79.5
	assert.Equal(t, "68", got["bonding_conductor|14 AWG copper|m"].String())
	assert.Equal(t, "2", got["disconnect|at least 12.65 A and 7-1/2 hp|each"].String())
}

// Conductors of 40 m, three lines: (40 + 1.5) × 3; the bonding conductor once, the
// raceway without ends.
func TestBillOfOneMotor(t *testing.T) {
	status, out, complaint := bills(t, "tag,code,kind,power,volts,termination_c,length_m,raceway\nM,NEC-2023,squirrel_cage,7-1/2 hp,460,75,40,EMT\n", "-format", "csv")
	require.Equal(t, allGood, status)
	assert.Empty(t, complaint)
	got := summed(t, out)
	for key, want := range map[string]string{
		"conductor|14 AWG copper THWN|m": "124.5", "bonding_conductor|14 AWG copper|m": "41.5", "raceway|EMT 1/2|m": "40",
		"device|20 A time-delay fuse|set": "1", "overload|overload relay of 3 units|each": "1", "controller|at least 7-1/2 hp|each": "1",
	} {
		assert.Equal(t, want, got[key].String(), key)
	}
}

func TestBillPrices(t *testing.T) {
	dir := t.TempDir()
	write := func(text string) string {
		path := filepath.Join(dir, "prices.csv")
		require.NoError(t, os.WriteFile(path, []byte(text), 0o600))
		return path
	}
	motor := "tag,code,kind,power,volts,termination_c,length_m,raceway\nM,NEC-2023,squirrel_cage,7-1/2 hp,460,75,40,EMT\n"
	status, out, _ := bills(t, motor, "-format", "csv", "-prices", write(onePrice))
	assert.Equal(t, allGood, status)
	assert.Contains(t, out, "raceway,EMT 1/2,m,40,3.25,130\n")
	assert.Contains(t, out, "bonding_conductor,14 AWG copper,m,41.5,,\n")
	_, out, _ = bills(t, motor, "-prices", write(onePrice))
	assert.Contains(t, out, "total of what has a price, to 0.01: 130.00\n")
	assert.NotContains(t, out, "invented")
	for text, want := range map[string]string{
		"": "no header", "kind,item\n": "no column unit_price", "kind,item,unit_price\na,b,-1\n": `unit_price "-1"`,
		"kind,item,unit_price\na,b,1e9\n": `unit_price "1e9"`, "kind,item,unit_price\na,b,1\na,b,2\n": "has a price already",
		"kind,item,unit_price\na,b\n": "wrong number of fields", "kind,item,unit_price\na,b,\n": `unit_price ""`,
		"kind,item,unit_price\na,b,1e-5\n": `unit_price "1e-5"`, "kind,item,unit_price\na,b,+5\n": `unit_price "+5"`,
		"kind,item,unit_price,unit_price\na,b,1,2\n": "names column unit_price twice",
	} {
		status, out, complaint := bills(t, motor, "-prices", write(text))
		assert.Equal(t, cannotRun, status, text)
		assert.Empty(t, out)
		assert.Contains(t, complaint, want)
	}
	status, out, _ = bills(t, motor, "-prices", write("\uFEFF"+onePrice+"raceway,emt 1/2,9\n"))
	assert.Equal(t, allGood, status)
	assert.Contains(t, out, "1 prices are of nothing in the bill")
	status, _, complaint := bills(t, motor, "-prices", "-")
	assert.Equal(t, cannotRun, status)
	assert.Contains(t, complaint, "standard input")
	status, _, complaint = bills(t, motor, "-format", "json")
	assert.Equal(t, cannotRun, status)
	assert.Contains(t, complaint, "want one of text, csv")
}

func FuzzPrices(f *testing.F) {
	for _, s := range []string{onePrice, "", "kind,item,unit_price\n\"", "item,kind,unit_price\nx,y,0.5\n", "kind,item,unit_price\na,b,٥\n"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, text string) {
		list, err := readPrices(strings.NewReader(text))
		if err != nil {
			require.Nil(t, list)
			return
		}
		for key, price := range list {
			require.False(t, price.IsNegative(), "%v", key)
		}
	})
}

// Items stand by number, fractions too.
func TestBillOrder(t *testing.T) {
	n, rest := number("RMC 1-1/4")
	assert.Equal(t, "RMC", rest)
	for _, larger := range []string{"RMC 1-1/2", "RMC 3", "RMC 3-1/2"} {
		m, _ := number(larger)
		assert.Positive(t, m.Cmp(n), larger)
		n = m
	}
}
