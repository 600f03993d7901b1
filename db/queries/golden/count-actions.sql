select coalesce(sum(state = 'agreed'), 0) as agreed, coalesce(sum(state = 'agreed' and until_on < ?), 0) as late, coalesce(sum(state = 'done'), 0) as done, coalesce(sum(state = 'dropped'), 0) as dropped
from (select * from actions where branch_id in (select value from json_each(?))) as `actions`
where state in (select value from json_each(?));
